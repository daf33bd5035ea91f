import { readFileSync } from 'node:fs';
import { parseArgs } from 'node:util';
import { z } from 'zod';
import { caseFromForecast, readAnswer, type CaseFrame } from './case-from-forecast.ts';
import { providerIds } from './provider.ts';

const usage = `Prints an assessment case made from a provider's stored answer, for \`npm run --silent assess\`.
  node --import tsx server/forecasts/case-command.ts --provider ${providerIds.join('|')} --zone ZONE --date YYYY-MM-DD [--minutes 30] [--limits JSON] [ANSWER.json]
Without a file the answer is read from standard input; the site is the place that the answer is for.`;

/** Wind at 2 m between 1.5 and 10 mph and four dry hours (common practice, no source): enough to look at a morning. */
const usualLimits = { windMaxMs: 4.4704, windMinMs: 0.67056, windHeightM: 2, rainFreeHours: 4 };

const optionsSchema = z.object({
  provider: z.enum(providerIds),
  zone: z.string().min(1),
  date: z.iso.date(),
  minutes: z.coerce.number().default(30),
  limits: z.string().transform((text): unknown => JSON.parse(text)).optional(),
});

try {
  const { values, positionals } = parseArgs({ allowPositionals: true, options: { provider: { type: 'string' }, zone: { type: 'string' }, date: { type: 'string' }, minutes: { type: 'string' }, limits: { type: 'string' } } });
  const { provider, zone, date, minutes, limits } = optionsSchema.parse(values);
  const { place, hours } = readAnswer(provider, JSON.parse(readFileSync(positionals[0] ?? 0, 'utf8')));
  const frame = { site: { ...place, elevationM: place.elevationM ?? 0, timeZone: zone }, date, minutesNeeded: minutes, limits: limits ?? usualLimits } as CaseFrame;
  console.log(JSON.stringify(caseFromForecast(hours, frame)));
} catch (error) {
  console.error(error instanceof z.ZodError ? error.issues.map((issue) => `${issue.path.join('.') || 'input'}: ${issue.message}`).join('\n') : String(error));
  console.error(usage);
  process.exitCode = 2;
}
