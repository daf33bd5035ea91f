import type { z } from 'zod';

type RawIssue = Parameters<z.core.$ZodErrorMap>[0];

const isEmpty = (input: unknown): boolean => input === undefined || input === null || input === '';

const kinds: Record<string, string> = {
  number: 'must be a number, such as 12.5',
  int: 'must be a whole number',
  string: 'must be text',
  boolean: 'must be true or false',
  array: 'must be a list',
  object: 'must be an object',
};

const formats: Record<string, string> = {
  date: 'must be a date such as 2026-06-10',
  datetime: 'must be an instant in UTC such as 2026-06-10T11:00:00.000Z',
  uuid: 'must be an id as the API gave it',
  url: 'must be a web address',
};

/** Plain words for what a schema says nothing of itself: the same beside a field of a form and in an answer of the API. */
export const plainMessages: z.core.$ZodErrorMap = (issue: RawIssue) => {
  switch (issue.code) {
    case 'invalid_type':
      return isEmpty(issue.input) ? 'must be filled in' : kinds[issue.expected];
    case 'invalid_format':
      return isEmpty(issue.input) ? 'must be filled in' : formats[issue.format];
    case 'invalid_value':
      return isEmpty(issue.input) ? 'must be chosen from the list' : `must be one of: ${issue.values.join(', ')}`;
    case 'too_big':
      if (issue.origin === 'array') return `must hold at most ${issue.maximum} entries`;
      return `must be at most ${issue.maximum}${issue.origin === 'string' ? ' characters' : ''}`;
    case 'too_small':
      if (issue.origin === 'array') return `must hold at least ${issue.minimum}`;
      if (issue.origin === 'number' && !issue.inclusive) return `must be more than ${issue.minimum}`;
      return `must be at least ${issue.minimum}${issue.origin === 'string' ? ' characters' : ''}`;
    default:
      return undefined;
  }
};
