import { once } from 'node:events';
import { type AddressInfo, createServer, type Socket } from 'node:net';

/** A mail server of a test: takes every letter, or refuses every recipient. */
export interface TestMailServer {
  url: string;
  /** The letters as they came over the wire. */
  received: string[];
  refuses: boolean;
  close(): Promise<void>;
}

/** Speaks as much of SMTP (RFC 5321) as a client needs to hand in a letter. */
function converse(socket: Socket, server: TestMailServer): void {
  let inData = false;
  let pending = '';
  socket.write('220 test\r\n');
  const answer = (line: string) => {
    if (/^EHLO|^HELO/i.test(line)) return '250 test';
    if (/^RCPT/i.test(line)) return server.refuses ? '550 nobody here' : '250 ok';
    if (/^DATA/i.test(line)) {
      inData = true;
      return '354 go on';
    }
    return /^QUIT/i.test(line) ? '221 bye' : '250 ok';
  };
  socket.on('error', () => undefined);
  socket.on('data', (bytes) => {
    pending += bytes.toString('utf8');
    if (inData) {
      const end = pending.indexOf('\r\n.\r\n');
      if (end < 0) return;
      server.received.push(pending.slice(0, end));
      pending = pending.slice(end + 5);
      inData = false;
      socket.write('250 taken\r\n');
    }
    for (let end = pending.indexOf('\r\n'); end >= 0 && !inData; end = pending.indexOf('\r\n')) {
      const line = pending.slice(0, end);
      pending = pending.slice(end + 2);
      socket.write(`${answer(line)}\r\n`);
    }
  });
}

/** Starts a mail server on loopback. */
export async function startMailServer(): Promise<TestMailServer> {
  const server: TestMailServer = { url: '', received: [], refuses: false, close: async () => undefined };
  const listener = createServer((socket) => converse(socket, server)).listen(0, '127.0.0.1');
  await once(listener, 'listening');
  server.url = `smtp://127.0.0.1:${(listener.address() as AddressInfo).port}`;
  server.close = async () => {
    listener.close();
    await once(listener, 'close');
  };
  return server;
}

/** A letter's text with the line joins of quoted-printable (RFC 2045, 6.7) taken out. */
export function unquoted(letter: string): string {
  return letter.replace(/=\r\n/g, '').replace(/=3D/g, '=');
}

/** The secret of the newest letter that carries a link of this kind. */
export function tokenIn(server: TestMailServer, path: 'invitation' | 'reset'): string {
  const pattern = new RegExp(`/${path}/([A-Za-z0-9_-]{43})`);
  for (const letter of [...server.received].reverse()) {
    const found = pattern.exec(unquoted(letter));
    if (found?.[1]) return found[1];
  }
  throw new Error(`no letter with a link to /${path}`);
}
