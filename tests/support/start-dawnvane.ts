import { spawn } from 'node:child_process';
import { mkdtempSync, realpathSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { leftOvers } from '../../server/database/mariadb-folder.ts';

const root = fileURLToPath(new URL('../..', import.meta.url));

export interface StartedDawnvane {
  /** Where it serves, or null when it ended without getting there. */
  address: string | null;
  pid: number;
  /** Everything it has said until now. */
  output(): string;
  /** Resolves with its exit code (or the signal's name) when it is over. */
  ended: Promise<number | string>;
  signal(name: NodeJS.Signals): void;
  /** SIGTERM, and its exit code. */
  stop(): Promise<number | string>;
}

/** The environment of a person at a fresh terminal: nothing of the test run's own. */
function cleanEnvironment(): NodeJS.ProcessEnv {
  return Object.fromEntries(Object.entries(process.env).filter(([name]) => !/^(DAWNVANE_|npm_|VITE|VITEST|NODE_ENV$|PORT$|HOST$|DATABASE_URL$|ROLES$|PUBLIC_URL$|TEST$)/.test(name)));
}

/** A production server that knows nobody yet: it is up at once, and has no farm to fetch or send anything for. */
export const production = {
  DAWNVANE_MODE: 'production',
  DAWNVANE_SECRET: Buffer.alloc(32, 7).toString('base64'),
  PUBLIC_URL: 'https://spray.example.org',
  FORECAST_PROVIDERS: 'openMeteo',
  CONTACT: 'mailto:keeper@example.org',
  SMTP_URL: 'smtp://127.0.0.1:9',
  MAIL_FROM: 'Dawnvane <notices@example.org>',
};

/** Begins `npm start`'s command as a child; `port` 0 unless the variables say otherwise. */
export function launchDawnvane(variables: Record<string, string>, flags: string[] = []): Omit<StartedDawnvane, 'address'> {
  const child = spawn(process.execPath, [join(root, 'server/setup/start.mjs'), ...flags], { cwd: tmpdir(), env: { ...cleanEnvironment(), PORT: '0', LOG_LEVEL: 'warn', ...variables }, stdio: ['ignore', 'pipe', 'pipe'] });
  let said = '';
  child.stdout.setEncoding('utf8').on('data', (text: string) => (said += text));
  child.stderr.setEncoding('utf8').on('data', (text: string) => (said += text));
  const ended = new Promise<number | string>((resolve) => child.once('close', (code, signal) => resolve(code ?? signal ?? 'unknown')));
  return {
    pid: child.pid!,
    output: () => said,
    ended,
    signal: (name) => void child.kill(name),
    stop: () => {
      child.kill('SIGTERM');
      return ended;
    },
  };
}

/** Starts the real command and waits until it is ready or over. */
export async function startDawnvane(variables: Record<string, string>, flags: string[] = []): Promise<StartedDawnvane> {
  const launched = launchDawnvane(variables, flags);
  const address = () => /listening on ([^\s)]+)/.exec(launched.output())?.[1] ?? /ready at (\S+)/.exec(launched.output())?.[1] ?? null;
  let over = false;
  void launched.ended.then(() => (over = true));
  while (!over && !/is ready/.test(launched.output())) await new Promise((resolve) => setTimeout(resolve, 25));
  return { ...launched, address: address() };
}

/** A data folder of its own, and its removal. */
export function temporaryFolder(): { path: string; remove(): void } {
  const path = realpathSync(mkdtempSync(join(tmpdir(), 'dawnvane-data-')));
  return { path, remove: () => rmSync(path, { recursive: true, force: true }) };
}

/** Process ids of the MariaDB that runs on a data folder. */
export const databasePids = (dataFolder: string): number[] => leftOvers(join(dataFolder, 'mariadb'), join(dataFolder, 'mariadb-init.sql'));
