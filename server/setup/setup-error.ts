/** A reason why the server cannot start, told in one sentence; the process ends with `exitCode`. */
export class SetupError extends Error {
  readonly exitCode: number;
  constructor(sentence: string, exitCode = 1) {
    super(sentence);
    this.name = 'SetupError';
    this.exitCode = exitCode;
  }
}

/** Turns errors of the file system into sentences. */
export function sentenceOf(error: unknown, doing: string): SetupError {
  if (error instanceof SetupError) return error;
  const { code, path, message } = error as NodeJS.ErrnoException;
  if (code === 'ENOSPC') return new SetupError(`The disk is full: ${doing} failed; make room and start again.`);
  if (code === 'EACCES' || code === 'EPERM') return new SetupError(`No right to ${doing}${path ? ` (${path})` : ''}: start as a user who may write there, or set DAWNVANE_DATA to another folder.`);
  if (code === 'EROFS') return new SetupError(`The file system is read-only: ${doing} failed; set DAWNVANE_DATA to a folder that can be written.`);
  return new SetupError(`Failed to ${doing}: ${message}`);
}
