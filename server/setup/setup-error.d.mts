/** A reason why Dawnvane cannot start, told in one sentence; the process ends with `exitCode`. */
export class SetupError extends Error {
  readonly exitCode: number;
  constructor(sentence: string, exitCode?: number);
}

/** Whether a program's own words say that the disk is full. */
export function saysDiskFull(text: string): boolean;

/** Turns an error of the file system or network into a sentence; `doing` completes "failed to …". */
export function sentenceOf(error: unknown, doing: string): SetupError;
