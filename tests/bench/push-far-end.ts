/** A push service for the benchmark, in a process of its own: HTTPS on loopback, takes everything, keeps nothing. Arguments: key file, certificate file. */
import { readFileSync } from 'node:fs';
import { createServer } from 'node:https';
import type { AddressInfo } from 'node:net';

const [keyFile, certificateFile] = process.argv.slice(2) as [string, string];
const server = createServer({ key: readFileSync(keyFile), cert: readFileSync(certificateFile), keepAlive: true }, (request, response) => {
  request.resume();
  request.on('end', () => response.writeHead(201).end());
});
server.keepAliveTimeout = 60_000;
server.listen(0, '127.0.0.1', () => process.stdout.write(`${(server.address() as AddressInfo).port}\n`));
