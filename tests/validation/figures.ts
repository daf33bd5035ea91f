import { mkdirSync, writeFileSync } from 'node:fs';
import type { Tenth } from './scores.ts';

/** Git-ignored. */
const folder = '.data/validation';

export function writeFigure(name: string, text: string): void {
  mkdirSync(folder, { recursive: true });
  writeFileSync(`${folder}/${name}`, text);
}

/** Reliability as CSV: one line per tenth of the chance said. */
export const reliabilityCsv = (tenths: readonly Tenth[]): string =>
  `${['from,hours,said,happened', ...tenths.map(({ from, hours, said, happened }) => [from.toFixed(1), hours, ...(hours === 0 ? ['', ''] : [said.toFixed(4), happened.toFixed(4)])].join(','))].join('\n')}\n`;

/** Judged hours as CSV: what was said and what happened. */
export const hoursCsv = (rows: readonly { at: string; said: number; happened: boolean }[]): string => `${['at,said,happened', ...rows.map(({ at, said, happened }) => `${at},${said.toFixed(4)},${happened ? 1 : 0}`)].join('\n')}\n`;

const size = 360;
const edge = 40;
const place = (share: number): number => edge + share * (size - 2 * edge);

/** Reliability as a picture: what happened over what was said, the dot's area by the hours, the bar two standard errors either way. */
export function reliabilitySvg(title: string, tenths: readonly Tenth[]): string {
  const most = Math.max(1, ...tenths.map(({ hours }) => hours));
  const y = (share: number): string => (size - place(Math.min(1, Math.max(0, share)))).toFixed(1);
  const dots = tenths.filter(({ hours }) => hours > 0).map(({ said, happened, hours }) => {
    const error = 2 * Math.sqrt((said * (1 - said)) / hours);
    const x = place(said).toFixed(1);
    return `<line x1="${x}" x2="${x}" y1="${y(happened - error)}" y2="${y(happened + error)}" stroke="#5d5a86"/><circle cx="${x}" cy="${y(happened)}" r="${(2 + 8 * Math.sqrt(hours / most)).toFixed(1)}" fill="#2f5d50" fill-opacity="0.8"><title>${hours} hours</title></circle>`;
  });
  const marks = [0, 0.5, 1].map((share) => `<text x="${place(share)}" y="${size - edge + 16}" text-anchor="middle">${share}</text><text x="${edge - 8}" y="${Number(y(share)) + 4}" text-anchor="end">${share}</text>`);
  return `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${size} ${size}" font-family="sans-serif" font-size="11" fill="#23261f"><rect width="${size}" height="${size}" fill="#fbf7ee"/><text x="${size / 2}" y="20" text-anchor="middle" font-size="13">${title.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;')}</text><line x1="${place(0)}" y1="${y(0)}" x2="${place(1)}" y2="${y(1)}" stroke="#c98f86" stroke-dasharray="4 4"/><rect x="${edge}" y="${edge}" width="${size - 2 * edge}" height="${size - 2 * edge}" fill="none" stroke="#23261f"/>${marks.join('')}<text x="${size / 2}" y="${size - 6}" text-anchor="middle">chance said</text><text x="12" y="${size / 2}" text-anchor="middle" transform="rotate(-90 12 ${size / 2})">share that happened</text>${dots.join('')}</svg>\n`;
}
