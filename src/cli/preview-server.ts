import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import { fileURLToPath } from 'node:url';
import { UsageError } from './errors.js';
import { servedFile } from './preview-files.js';

/** How the last build went, as the page around the pages shows it. */
export interface PreviewState {
  readonly standing: string;
  /** Of the last build; empty when it was good. */
  readonly problems: string;
  readonly failed: boolean;
  /** Number of good builds so far. */
  readonly good: number;
  /** Address of the first page of the last good build. */
  readonly page: string | null;
}

export interface PreviewServer {
  readonly address: string;
  tell(state: PreviewState): void;
  close(): Promise<void>;
}

/** The only interface that is listened on: nobody else on the network sees a draft. */
const LOOPBACK = '127.0.0.1';
const shell = fileURLToPath(new URL('../../templates/preview', import.meta.url));
const policy = "default-src 'self'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'";

/**
 * Serves the pages in a folder under `/site/`, and around them a page that is told of every build.
 *
 * @param port  0 for any free one
 * @throws UsageError when the port cannot be had
 */
export async function startServer(folder: string, port: number, initial: PreviewState): Promise<PreviewServer> {
  let state = initial;
  const listeners = new Set<ServerResponse>();
  const hosts = new Set<string>();
  const server = createServer((request, response) => {
    response.setHeader('Cache-Control', 'no-store');
    response.setHeader('X-Content-Type-Options', 'nosniff');
    response.setHeader('Cross-Origin-Resource-Policy', 'same-origin');
    // A name that someone points at this computer is not its own.
    if (!hosts.has(request.headers.host ?? '')) refuse(response, 403, 'Not an address of this preview.');
    else if (request.method !== 'GET' && request.method !== 'HEAD') {
      response.setHeader('Allow', 'GET, HEAD');
      refuse(response, 405, 'Pages can only be read.');
    } else {
      const path = (request.url ?? '').split(/[?#]/)[0];
      if (path === '/-/events') listen(request, response);
      else answer(request, response, path);
    }
  });

  function listen(request: IncomingMessage, response: ServerResponse): void {
    response.writeHead(200, { 'Content-Type': 'text/event-stream' });
    if (request.method === 'HEAD') {
      response.end();
      return;
    }
    response.write(message(state));
    listeners.add(response);
    request.on('close', () => listeners.delete(response));
  }

  function answer(request: IncomingMessage, response: ServerResponse, path: string): void {
    const own = path === '/' ? 'index.html' : path.startsWith('/-/') ? path.slice('/-/'.length) : undefined;
    const file =
      own !== undefined
        ? servedFile(shell, own)
        : path.startsWith('/site/')
          ? servedFile(folder, path.slice('/site/'.length))
          : undefined;
    if (file === undefined) {
      refuse(response, 404, 'No such page.');
      return;
    }
    if (own !== undefined) response.setHeader('Content-Security-Policy', policy);
    response.writeHead(200, { 'Content-Type': file.type, 'Content-Length': file.content.length });
    response.end(request.method === 'HEAD' ? undefined : file.content);
  }

  const taken = await new Promise<number>((resolve, reject) => {
    server.once('error', (error: NodeJS.ErrnoException) => {
      const why = error.code === 'EADDRINUSE' ? 'it is in use' : error.message;
      reject(new UsageError(`cannot serve on port ${port}: ${why}; name another with --port`));
    });
    server.listen(port, LOOPBACK, () => {
      const address = server.address();
      resolve(typeof address === 'object' && address !== null ? address.port : port);
    });
  });
  for (const name of [LOOPBACK, 'localhost']) hosts.add(`${name}:${taken}`);

  return {
    address: `http://${LOOPBACK}:${taken}/`,
    tell(next) {
      state = next;
      for (const response of listeners) response.write(message(state));
    },
    close: () =>
      new Promise((resolve) => {
        for (const response of listeners) response.end();
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}

const message = (state: PreviewState): string => `data: ${JSON.stringify(state)}\n\n`;

function refuse(response: ServerResponse, code: number, words: string): void {
  response.writeHead(code, { 'Content-Type': 'text/plain; charset=utf-8' });
  response.end(`${words}\n`);
}
