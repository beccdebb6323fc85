import { cacheNames } from 'workbox-core';

/** Files of the version before the present one: a page that was open during an update may still ask for them. */
const EARLIER = 'undereave-earlier-shell';

/** Is this a file of a build, whose name changes whenever its content does? */
export function isBuiltFile(url: URL): boolean {
  return url.pathname.startsWith('/_next/static/');
}

/** Copies the built files stored so far, in place of those of the version before them. */
export async function keepEarlierShell(): Promise<void> {
  const stored = await caches.open(cacheNames.precache);
  const files = (await stored.keys()).filter((request) => isBuiltFile(new URL(request.url)));
  if (files.length === 0) return;
  await caches.delete(EARLIER);
  const earlier = await caches.open(EARLIER);
  for (const request of files) {
    const response = await stored.match(request);
    if (response) await earlier.put(request, response);
  }
}

/** Answers for a built file that the present version does not have: from the version before, else from the network. */
export async function answerFromEarlierShell({ request }: { request: Request }): Promise<Response> {
  const earlier = await caches.open(EARLIER);
  return (await earlier.match(request, { ignoreSearch: true })) ?? fetch(request);
}
