import { existsSync, readFileSync } from 'node:fs';
import { SetupError, saysDiskFull } from '../setup/setup-error.mjs';

/** The last line that says something. */
export const lastLine = (text: string): string => text.trim().split('\n').map((line) => line.trim()).filter(Boolean).at(-1) ?? 'it gave no reason';

const wordsOf = (logFile: string): string => (existsSync(logFile) ? readFileSync(logFile, 'utf8').slice(-50_000) : '');

/** MariaDB waits long for a lock that another one holds; its log tells at once. */
export const isHeldByAnother = (logFile: string): boolean => /Can't lock aria control file|Unable to lock \.?\S*ibdata|Could not get an exclusive lock/i.test(wordsOf(logFile));

/** The port was free when we looked and is not any more. */
export const portWasTaken = (logFile: string): boolean => /Address already in use|Bind on TCP\/IP port/i.test(wordsOf(logFile));

/** Why MariaDB did not come up, told from its log in one sentence. */
export function whyItEnded(logFile: string, dataFolder: string): SetupError {
  const log = wordsOf(logFile);
  if (isHeldByAnother(logFile)) return new SetupError(`Another MariaDB is using ${dataFolder}: end that one, or set DAWNVANE_DATA to another folder.`);
  if (saysDiskFull(log)) return new SetupError('The disk is full: MariaDB could not start; make room and start again.');
  if (/Permission denied|Errcode: 13/i.test(log)) return new SetupError(`MariaDB has no right to its folder ${dataFolder}: start as the user who owns it, or set DAWNVANE_DATA to another folder.`);
  if (/after a crash is not supported|Upgrade after a crash|created by MariaDB|Unsupported redo log format|redo log was created/i.test(log)) return new SetupError(`${dataFolder} was written by another version of MariaDB: start once with that version, or set DAWNVANE_DATA to another folder.`);
  const errors = log.split('\n').filter((line) => line.includes('[ERROR]') && !line.includes('Aborting'));
  return new SetupError(`MariaDB did not start: ${lastLine(errors[0] ?? log).replace(/^.*\[ERROR\] /, '')} (${logFile} tells more).`);
}
