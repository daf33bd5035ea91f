/** `npm run season -- FILE`: how many mornings of an hourly record were fit, month by month, and what bound the others. */
import { readRecord } from './record.ts';
import { byMonth, judgeSeason, usualPlan } from './season.ts';

const path = process.argv[2];
if (path === undefined || process.argv.length > 3) {
  console.error('usage: npm run season -- FILE\nFILE is a typical year (TMY3), a mast (.SFC or .PFL beside each other) or the crop field (CSV).');
  process.exit(2);
}

try {
  const record = readRecord(path);
  const plan = usualPlan(record);
  const months = byMonth(judgeSeason(record, plan));
  const bounds = [...new Set(months.flatMap(({ boundBy }) => [...boundBy.keys()]))].sort();
  const head = ['month', 'mornings', 'fit', 'no data', ...bounds];
  const sum = (of: (row: (typeof months)[number]) => number): number => months.reduce((total, row) => total + of(row), 0);
  const rows = months.map((row) => [row.month, row.mornings, row.fit, row.notEnough, ...bounds.map((limit) => row.boundBy.get(limit) ?? 0)]);
  rows.push(['all', sum((row) => row.mornings), sum((row) => row.fit), sum((row) => row.notEnough), ...bounds.map((limit) => sum((row) => row.boundBy.get(limit) ?? 0))]);
  console.log(`${record.name}: latitude ${record.site.latitude}, longitude ${record.site.longitude}; ${plan.minutesNeeded} minutes and ${plan.reserveMinutes} in reserve`);
  console.log(`limits that the record can tell: ${Object.keys(plan.limits).join(', ')}\n`);
  const widths = head.map((title) => Math.max(title.length, 8));
  for (const cells of [head, ...rows]) console.log(cells.map((cell, index) => (index === 0 ? String(cell).padEnd(widths[index]!) : String(cell).padStart(widths[index]!))).join('  '));
} catch (error) {
  console.error(error instanceof Error ? error.message : String(error));
  process.exit(2);
}
