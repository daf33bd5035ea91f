import type { AnswerOptions } from './answer-of.ts';
import { assess } from './assess.ts';
import { parseCase, type CaseProblem } from './problems.ts';

/** What the assess command prints for one input, and its problems when it is none. */
export interface CommandAnswer {
  answer: unknown;
  problems: CaseProblem[] | null;
}

/** Answers one text: the assessment, or what is wrong with it. */
export function answerText(text: string, options: AnswerOptions = {}): CommandAnswer {
  if (text.trim() === '') return problem('is empty; give a case as JSON');
  let value: unknown;
  try {
    value = JSON.parse(text.replace(/^\uFEFF/, ''));
  } catch (error) {
    return problem(`is not JSON: ${error instanceof Error ? error.message.slice(0, 200) : 'unreadable'}`);
  }
  const parsed = parseCase(value);
  if (!parsed.ok) return { answer: { problems: parsed.problems }, problems: parsed.problems };
  return { answer: assess(parsed.case, options), problems: null };
}

/** A problem of the whole input. */
export function problem(message: string): CommandAnswer & { problems: CaseProblem[] } {
  const problems = [{ path: '', message }];
  return { answer: { problems }, problems };
}
