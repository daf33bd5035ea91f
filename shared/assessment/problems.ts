import type { z } from 'zod';
import { caseSchema, type AssessmentCase } from './case.ts';

/** One thing wrong with a case: the path of its field (`hours.3.windSpeed10mMs`) and what to do. */
export interface CaseProblem {
  path: string;
  message: string;
}

export type ParsedCase = { ok: true; case: AssessmentCase } | { ok: false; problems: CaseProblem[] };

/** More problems than this are counted, not listed. */
const mostListed = 100;
/** Arrays longer than this are refused before each entry is looked at. */
const mostEntries = { hours: 24 * 17, readings: 2000, sensitivePlaces: 100 } as const;

const named = (value: unknown): string => (value === null ? 'null' : Array.isArray(value) ? 'a list' : typeof value === 'string' ? 'text' : typeof value === 'object' ? 'an object' : `a ${typeof value}`);

/** Says what is wrong with one value, for a person. */
function sentence(issue: z.core.$ZodRawIssue): string | undefined {
  switch (issue.code) {
    case 'invalid_type':
      if (issue.input === undefined) return `is missing; give ${issue.expected === 'array' ? 'a list' : issue.expected === 'object' ? 'an object' : `a ${issue.expected}`}`;
      if (typeof issue.input === 'number') return issue.expected === 'number' ? 'must be a finite number' : `must be a ${issue.expected}, not a number`;
      return `must be ${issue.expected === 'array' ? 'a list' : issue.expected === 'object' ? 'an object' : `a ${issue.expected}`}, not ${named(issue.input)}`;
    case 'too_big':
      if (issue.origin === 'array') return `must hold at most ${issue.maximum} entries`;
      if (issue.origin === 'string') return `must be at most ${issue.maximum} characters`;
      return `must be at most ${issue.maximum}`;
    case 'too_small':
      if (issue.origin === 'array') return `must hold at least ${issue.minimum} entries`;
      if (issue.origin === 'string') return issue.minimum === 1 ? 'must not be empty' : `must be at least ${issue.minimum} characters`;
      return issue.inclusive === false ? `must be more than ${issue.minimum}` : `must be at least ${issue.minimum}`;
    case 'invalid_format':
      if (issue.format === 'datetime') return 'must be an instant in UTC such as 2026-06-10T11:00:00Z';
      if (issue.format === 'date') return 'must be a date of the calendar such as 2026-06-10';
      return undefined;
    case 'invalid_value':
      return `must be one of ${issue.values.map((value) => JSON.stringify(value)).join(', ')}`;
    case 'unrecognized_keys':
      return `has no field ${issue.keys.slice(0, 5).map((key) => JSON.stringify(key.slice(0, 60))).join(', ')}; take it out or correct its name`;
    default:
      return undefined;
  }
}

/**
 * Reads a case from a value of any kind.
 * @returns the case with its defaults filled in, or every problem by path (at most 100 listed)
 */
export function parseCase(value: unknown): ParsedCase {
  if (typeof value === 'object' && value !== null) {
    for (const [field, most] of Object.entries(mostEntries)) {
      const list: unknown = Object.hasOwn(value, field) ? (value as Record<string, unknown>)[field] : undefined;
      if (Array.isArray(list) && list.length > most) return { ok: false, problems: [{ path: field, message: `must hold at most ${most} entries, not ${list.length}` }] };
    }
  }
  const parsed = caseSchema.safeParse(value, { error: sentence });
  if (parsed.success) return { ok: true, case: parsed.data };
  const problems = parsed.error.issues.slice(0, mostListed).map(({ path, message }) => ({ path: path.map(String).join('.'), message }));
  if (parsed.error.issues.length > mostListed) problems.push({ path: '', message: `and ${parsed.error.issues.length - mostListed} more` });
  return { ok: false, problems };
}
