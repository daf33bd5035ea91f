import { randomUUID } from 'node:crypto';
import type { AddressInfo } from 'node:net';
import { simpleParser, type AddressObject } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import type { z } from 'zod';
import type { demoMailSchema } from '../../shared/api/system.ts';
import { KeptLog } from '../kept-log.ts';

export type DemoMail = z.infer<typeof demoMailSchema>;

/** A mail as it came, with the headers that tests look at. */
export interface ReceivedMail extends DemoMail {
  messageId: string | null;
  references: string[];
  headers: Record<string, string>;
}

/** What the relay answers once: a reply code, or a dropped connection after it has taken the mail. */
export type MailFault = { code: number; text?: string } | { dropAfterTaking: true };

export interface MailSink {
  /** For the server's transport. */
  url: string;
  /** Newest first. */
  mails(): ReceivedMail[];
  /** Forgets what was received. */
  clear(): void;
  failNext(fault: MailFault, times?: number): void;
  stop(): Promise<void>;
}

const addressText = (addresses: AddressObject | AddressObject[] | undefined): string => (addresses ? [addresses].flat().map((one) => one.text).join(', ') : '');

/** A mail relay on a free port of loopback that keeps what it gets. */
export async function startMailSink({ clock, logFile = null }: { clock: { now(): Date }; logFile?: string | null }): Promise<MailSink> {
  const log = new KeptLog<ReceivedMail>(logFile);
  const faults: MailFault[] = [];
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    disableReverseLookup: true,
    onData(stream, _session, answer) {
      simpleParser(stream, { skipTextToHtml: true }).then(
        (mail) => {
          const fault = faults.shift();
          if (fault && 'code' in fault) {
            answer(Object.assign(new Error(fault.text ?? 'Not now'), { responseCode: fault.code }));
            return;
          }
          log.add({
            id: randomUUID(), receivedAt: clock.now().toISOString(), from: addressText(mail.from), to: addressText(mail.to), subject: mail.subject ?? '', text: mail.text ?? '', html: mail.html || '',
            messageId: mail.messageId ?? null, references: [mail.references ?? []].flat(), headers: Object.fromEntries(mail.headerLines.map(({ key, line }) => [key, line.slice(line.indexOf(':') + 1).trim()])),
          });
          if (fault) for (const connection of server.connections) (connection as unknown as { _socket: { destroy(): void } })._socket.destroy();
          else answer();
        },
        (error: Error) => answer(error),
      );
    },
  });
  server.on('error', () => undefined);
  await new Promise<void>((resolve, reject) => {
    server.server.once('error', reject);
    server.listen(0, '127.0.0.1', resolve);
  });
  const { port } = server.server.address() as AddressInfo;
  return {
    url: `smtp://127.0.0.1:${port}`,
    mails: () => log.items,
    clear: () => log.clear(),
    failNext: (fault, times = 1) => {
      for (let time = 0; time < times; time += 1) faults.push(fault);
    },
    stop: () => new Promise((resolve) => server.close(() => resolve())),
  };
}
