import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { DemoPhone } from '../../mocks/push-service/phone.ts';
import { decryptPush } from '../../mocks/push-service/decrypt.ts';

/** One message as it reached the device behind the push service. */
export interface Arrival {
  topic: string;
  tag: string;
  token: string;
  title: string;
}

/** A push service in plain HTTP on loopback, so that other processes reach it. It decrypts what comes, for one device. */
export class PushEnd {
  readonly arrivals: Arrival[] = [];
  readonly phone = new DemoPhone('fault phone', null);
  readonly #server: Server;
  #waiting: { count: number; resolve: () => void }[] = [];

  /** @param answerMs how long an answer takes */
  constructor(answerMs: number) {
    this.#server = createServer((request, response) => {
      const chunks: Buffer[] = [];
      request.on('data', (chunk: Buffer) => chunks.push(chunk));
      request.on('end', () => {
        const text = decryptPush(Buffer.concat(chunks), this.phone.keys).plaintext.toString('utf8');
        const { notification } = JSON.parse(text) as { notification: { title: string; tag: string; data: { token: string } } };
        this.arrivals.push({ topic: String(request.headers['topic']), tag: notification.tag, token: notification.data.token, title: notification.title });
        this.#waiting = this.#waiting.filter(({ count, resolve }) => (this.arrivals.length >= count ? (resolve(), false) : true));
        setTimeout(() => response.writeHead(201).end(), answerMs);
      });
    });
  }

  async listen(): Promise<string> {
    await new Promise<void>((resolve) => this.#server.listen(0, '127.0.0.1', resolve));
    return `http://127.0.0.1:${(this.#server.address() as AddressInfo).port}/device`;
  }

  /** Resolves when so many messages have arrived. */
  arrived(count: number): Promise<void> {
    if (this.arrivals.length >= count) return Promise.resolve();
    return new Promise((resolve) => this.#waiting.push({ count, resolve }));
  }

  async close(): Promise<void> {
    this.#server.closeAllConnections();
    await new Promise((resolve) => this.#server.close(resolve));
  }
}
