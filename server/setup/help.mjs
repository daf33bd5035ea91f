import { readFileSync } from 'node:fs';

/** The text of `npm start -- --help`; needs no package, so that it is there before the first install. */
export function helpText() {
  const variables = JSON.parse(readFileSync(new URL('variables.json', import.meta.url), 'utf8'));
  const width = Math.max(...Object.keys(variables).map((name) => name.length));
  const lines = Object.entries(variables).map(([name, { help, default: fallback }]) => `  ${name.padEnd(width)}  ${help}${fallback ? ` (default: ${fallback})` : ''}`);
  return [
    'Starts Dawnvane: installs what is missing, starts its database, serves the pages.',
    '',
    'npm start                                   all parts in one process',
    'npm start -- --role worker,scheduler        only some of: web, worker, scheduler',
    'npm start -- --help                         this text',
    '',
    'Variables of the environment:',
    ...lines,
  ].join('\n');
}
