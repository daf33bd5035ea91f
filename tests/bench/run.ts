/** `npm run bench [-- name …]`: figures and ratios of each benchmark beside its baseline, all in one run. */
import type { BenchLine } from './line.ts';

const benchmarks: Record<string, () => Promise<{ run: () => Promise<BenchLine[]> }>> = {
  assess: () => import('./assess.ts'),
  api: () => import('./api.ts'),
  delivery: () => import('./delivery.ts'),
  web: () => import('./web.ts'),
};

const asked = process.argv.slice(2).filter((word) => !word.startsWith('-'));
const unknown = asked.filter((name) => !(name in benchmarks));
if (unknown.length > 0) {
  console.error(`No benchmark named ${unknown.join(', ')}; there are ${Object.keys(benchmarks).join(', ')}.`);
  process.exit(2);
}

const figure = (value: number): string => (Math.abs(value) >= 100 ? Math.round(value).toLocaleString('en-US') : value.toPrecision(3));

for (const [name, load] of Object.entries(benchmarks)) {
  if (asked.length > 0 && !asked.includes(name)) continue;
  console.log(`\n${name}`);
  const { run } = await load();
  for (const line of await run()) {
    const beside = line.baseline ? `, ${line.baseline.name} ${figure(line.baseline.value)} ${line.unit}` : '';
    const ratio = line.ratio === undefined ? '' : `, ratio ${line.ratio.toFixed(2)}`;
    const goal = line.goal ? `  (goal ${line.goal}${line.met === undefined ? '' : line.met ? ': met' : ': MISSED'})` : '';
    console.log(`  ${line.name}: ${figure(line.value)} ${line.unit}${beside}${ratio}${goal}`);
  }
}
process.exit(0);
