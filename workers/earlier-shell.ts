import { cacheNames } from 'workbox-core';

/** Files of earlier versions: a page that was open during an update may still ask for them. */
const EARLIER = 'undereave-earlier-shell';

/** Is this a file of a build, whose name changes whenever its content does? */
export function isBuiltFile(url: URL): boolean {
  return url.pathname.startsWith('/_next/static/');
}

/** Copies the built files stored so far beside those of still earlier versions. */
export async function keepEarlierShell(): Promise<void> {
  const stored = await caches.open(cacheNames.precache);
  const earlier = await caches.open(EARLIER);
  for (const request of await stored.keys()) {
    const response = isBuiltFile(new URL(request.url)) ? await stored.match(request) : undefined;
    if (response) await earlier.put(request, response);
  }
}

/**
 * Drops the files of earlier versions when no page is open that could ask for them: called when one is about to open.
 *
 * @param clients the pages that live now.
 */
export async function forgetEarlierShell(clients: Clients): Promise<void> {
  const pages = await clients.matchAll({ type: 'window', includeUncontrolled: true });
  if (pages.length === 0) await caches.delete(EARLIER);
}

/** Answers for a built file that the present version does not have: from an earlier one, else from the network. */
export async function answerFromEarlierShell({ request }: { request: Request }): Promise<Response> {
  const earlier = await caches.open(EARLIER);
  return (await earlier.match(request, { ignoreSearch: true })) ?? fetch(request);
}
