/** A reason why nothing can start, told in one sentence. */
export class StartError extends Error {
  constructor(sentence, exitCode = 1) {
    super(sentence);
    this.name = 'SetupError';
    this.exitCode = exitCode;
  }
}
