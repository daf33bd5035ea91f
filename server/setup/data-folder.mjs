import { existsSync, mkdirSync, readdirSync, realpathSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { claim, holderOf } from './only-one.mjs';
import { SetupError, sentenceOf } from './setup-error.mjs';

const marker = 'dawnvane-data.json';

/** The folder of database, uploads and generated secrets: DAWNVANE_DATA, or `.data` in the project. */
export const dataFolderOf = (env, root) => resolve(root, env.DAWNVANE_DATA || '.data');

/**
 * Makes the data folder when it is missing and claims it for this process, so that two servers never share one.
 * @returns a function that gives the claim up
 * @throws SetupError when the folder is another program's, in another server's use, or cannot be written
 */
export async function openDataFolder(folder) {
  try {
    mkdirSync(folder, { recursive: true, mode: 0o700 });
    const names = readdirSync(folder).filter((name) => name !== 'lost+found');
    if (names.length > 0 && !names.includes(marker)) {
      throw new SetupError(`${folder} holds things that are not Dawnvane's (${names.slice(0, 3).join(', ')}${names.length > 3 ? ', …' : ''}): set DAWNVANE_DATA to an empty or new folder.`);
    }
    const name = `data folder ${realpathSync(folder)}`;
    const release = await claim(name);
    if (!release) throw new SetupError(`Dawnvane already runs on ${folder} (process ${(await holderOf(name)) ?? 'unknown'}): end that one, or set DAWNVANE_DATA to another folder.`);
    if (!existsSync(join(folder, marker))) writeFileSync(join(folder, marker), `${JSON.stringify({ about: 'Data of Dawnvane: database, uploads and secrets.' })}\n`, { mode: 0o600 });
    return release;
  } catch (error) {
    throw sentenceOf(error, `write to the data folder ${folder}`);
  }
}
