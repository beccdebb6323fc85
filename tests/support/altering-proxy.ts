import { once } from 'node:events';
import { type IncomingHttpHeaders, type Server, createServer, request } from 'node:http';
import type { AddressInfo } from 'node:net';

/** What a proxy does with a path: nothing, answer 404, or change the text. */
export type Alteration = 'gone' | ((text: string) => string) | null;

/** A server in front of another one that can change single answers: a new version without a new build. */
export interface AlteringProxy {
  origin: string;
  /** Decides what happens to a path from now on. */
  alter(decide: (path: string) => Alteration): void;
  close(): Promise<void>;
}

/** Headers as the server behind has to see them: its own origin, and plain text back. */
function forwarded(headers: IncomingHttpHeaders, from: string, to: string): IncomingHttpHeaders {
  // No conditions either: "not modified" is no answer to change.
  const { 'accept-encoding': _encoding, 'if-none-match': _tag, 'if-modified-since': _since, ...rest } = headers;
  const own = Object.entries(rest).map(([name, value]) => [
    name,
    typeof value === 'string' ? value.replaceAll(from, to) : value,
  ]);
  return { ...Object.fromEntries(own), host: new URL(to).host };
}

function textOf(chunks: readonly Buffer[], change: (text: string) => string): Buffer {
  return Buffer.from(change(Buffer.concat(chunks).toString('utf8')));
}

async function portOf(server: Server): Promise<number> {
  server.listen(0, '127.0.0.1');
  await once(server, 'listening');
  return (server.address() as AddressInfo).port;
}

/** Starts a proxy in front of `target`. */
export async function startAlteringProxy(target: string): Promise<AlteringProxy> {
  let decide: (path: string) => Alteration = () => null;
  let origin = '';
  const server = createServer((incoming, outgoing) => {
    const path = incoming.url ?? '/';
    const change = decide(path);
    if (change === 'gone') return void outgoing.writeHead(404).end();
    const headers = forwarded(incoming.headers, origin, target);
    const behind = request(new URL(path, target), { method: incoming.method, headers }, (answer) => {
      const chunks: Buffer[] = [];
      answer.on('data', (chunk: Buffer) => chunks.push(chunk));
      answer.on('end', () => {
        const { 'content-length': _length, 'transfer-encoding': _encoding, ...rest } = answer.headers;
        const location = rest.location?.replaceAll(target, origin);
        const body = change ? textOf(chunks, change) : Buffer.concat(chunks);
        outgoing.writeHead(answer.statusCode ?? 502, { ...rest, ...(location && { location }) }).end(body);
      });
    });
    behind.on('error', () => outgoing.writeHead(502).end());
    incoming.pipe(behind);
  });
  origin = `http://127.0.0.1:${await portOf(server)}`;
  return {
    origin,
    alter: (next) => {
      decide = next;
    },
    close: async () => {
      server.closeAllConnections();
      server.close();
      await once(server, 'close');
    },
  };
}
