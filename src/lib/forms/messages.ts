import type { z } from 'zod';

type RawIssue = Parameters<z.core.$ZodErrorMap>[0];

/** Plain words for what a schema says nothing of itself. */
export const plainMessages: z.core.$ZodErrorMap = (issue: RawIssue) => {
  const empty = issue.input === undefined || issue.input === null || issue.input === '';
  switch (issue.code) {
    case 'invalid_type':
      if (empty) return 'must be filled in';
      if (issue.expected === 'number') return 'must be a number, such as 12.5';
      if (issue.expected === 'int') return 'must be a whole number';
      return undefined;
    case 'invalid_format':
      if (empty) return 'must be filled in';
      return issue.format === 'date' ? 'must be a date' : undefined;
    case 'invalid_value':
      return 'must be chosen from the list';
    case 'too_big':
      return `must be at most ${issue.maximum}${issue.origin === 'string' ? ' characters' : ''}`;
    case 'too_small':
      return issue.origin === 'number' && issue.minimum === 0 && !issue.inclusive ? 'must be more than 0' : `must be at least ${issue.minimum}${issue.origin === 'string' ? ' characters' : ''}`;
    default:
      return undefined;
  }
};
