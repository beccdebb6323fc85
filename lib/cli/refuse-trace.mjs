// Loaded before the web server (`node --import`). The framework turns every request into a web `Request`, whose
// standard forbids the method TRACE, and then answers 500. TRACE is answered here, before the framework sees it:
// nothing is echoed, so no cookie can be read back through it.
import { randomUUID } from 'node:crypto';
import { Server } from 'node:http';

const emit = Server.prototype.emit;

/** @param {import('node:http').ServerResponse} response */
function refuse(response) {
  const title = 'This address does not take that method.';
  const problem = { type: 'urn:undereave:problem:method', title, status: 405, code: 'method', requestId: randomUUID() };
  response.writeHead(405, {
    'content-type': 'application/problem+json',
    'cache-control': 'no-store',
    'x-content-type-options': 'nosniff',
    allow: 'GET, HEAD, POST',
  });
  response.end(JSON.stringify(problem));
}

/** @type {(this: Server, event: string | symbol, ...rest: any[]) => boolean} */
Server.prototype.emit = function (event, ...rest) {
  if (event !== 'request' || rest[0].method !== 'TRACE') return emit.call(this, event, ...rest);
  refuse(rest[1]);
  return true;
};
