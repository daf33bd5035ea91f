/** A reason why Dawnvane cannot start, told in one sentence; the process ends with `exitCode`. */
export class SetupError extends Error {
  /** @param {string} sentence @param {number} [exitCode] */
  constructor(sentence, exitCode = 1) {
    super(sentence);
    this.name = 'SetupError';
    this.exitCode = exitCode;
  }
}

/** Whether a program's own words say that the disk is full. @param {string} text */
export const saysDiskFull = (text) => /ENOSPC|No space left|Errcode: 28|error(?: number)?:? 28\b|Disk is full/i.test(text);

/**
 * Turns an error of the file system or network into a sentence.
 * @param {unknown} error
 * @param {string} doing completes "failed to …"
 */
export function sentenceOf(error, doing) {
  if (error instanceof SetupError) return error;
  const { code, path, message } = /** @type {NodeJS.ErrnoException} */ (error);
  const where = path && !doing.includes(path) ? ` (${path})` : '';
  if (code === 'ENOSPC' || code === 'EDQUOT') return new SetupError(`The disk is full: failed to ${doing}; make room and start again.`);
  if (code === 'EACCES' || code === 'EPERM') return new SetupError(`No right to ${doing}${where}: start as a user who may do so, or set DAWNVANE_DATA to another folder.`);
  if (code === 'EROFS') return new SetupError(`The file system is read-only: failed to ${doing}${where}; set DAWNVANE_DATA to a folder that can be written.`);
  if (code === 'ENOTDIR' || code === 'EEXIST') return new SetupError(`A file stands where a folder is needed: failed to ${doing}${where}; move it away, or set DAWNVANE_DATA to another folder.`);
  return new SetupError(`Failed to ${doing}: ${message}`);
}
