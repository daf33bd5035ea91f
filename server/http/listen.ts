import { createServer, type RequestListener } from 'node:http';
import type { AddressInfo } from 'node:net';
import { SetupError, sentenceOf } from '../setup/setup-error.mjs';

/** A port that is ours from the first moment, and answers "starting" until there is something to serve. */
export interface Listening {
  port: number;
  serve(handler: RequestListener): void;
  /** Takes no new connection, lets open requests end for a moment, then cuts what is left (live streams). */
  close(): Promise<void>;
}

const lastRequestsMs = 3000;

const starting: RequestListener = (_request, response) => {
  response.writeHead(503, { 'content-type': 'application/problem+json', 'retry-after': '2' }).end(JSON.stringify({ type: 'about:blank', status: 503, title: 'Starting', detail: 'Dawnvane is starting; try again in a moment.' }));
};

/** @throws SetupError when the port or address cannot be had */
export function listen(port: number, host: string): Promise<Listening> {
  const server = createServer(starting);
  return new Promise((resolve, reject) => {
    server.once('error', (error: NodeJS.ErrnoException) => {
      if (error.code === 'EADDRINUSE') reject(new SetupError(`Port ${port} on ${host} is taken by another program: end that one, or choose another port with PORT=… (0 takes a free one).`));
      else if (error.code === 'EACCES') reject(new SetupError(`No right to listen on port ${port}: choose one above 1023 with PORT=…`));
      else if (error.code === 'EADDRNOTAVAIL' || error.code === 'ENOTFOUND') reject(new SetupError(`${host} is no address of this machine: correct HOST.`));
      else reject(sentenceOf(error, `listen on ${host}:${port}`));
    });
    server.listen(port, host, () => {
      resolve({
        port: (server.address() as AddressInfo).port,
        serve(handler) {
          server.off('request', starting);
          server.on('request', handler);
        },
        close: () =>
          new Promise((closed) => {
            if (!server.listening) {
              closed();
              return;
            }
            const cut = setTimeout(() => server.closeAllConnections(), lastRequestsMs);
            server.close(() => {
              clearTimeout(cut);
              closed();
            });
          }),
      });
    });
  });
}
