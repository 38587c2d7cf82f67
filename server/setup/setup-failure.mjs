import { exitStatuses } from './exit-statuses.mjs';

/** Setting up cannot go on. The message is one sentence for the person at the terminal. */
export class SetupFailure extends Error {
  /**
   * @param {keyof typeof exitStatuses} reason
   * @param {string} sentence
   * @param {unknown} [cause]
   */
  constructor(reason, sentence, cause) {
    super(sentence, { cause });
    this.name = 'SetupFailure';
    this.reason = reason;
    this.status = exitStatuses[reason];
  }
}

/**
 * Says one sentence on stderr, the stack too where somebody looks for it, and gives the exit status.
 * @param {unknown} error
 * @returns {number}
 */
export function reportFailure(error) {
  const known = error instanceof SetupFailure || (error instanceof Error && 'kind' in error && error.kind === 'settings');
  const message = error instanceof Error ? error.message : String(error);
  const sentence = known ? message : `Something unexpected went wrong: ${message || 'no reason was given'}`;
  process.stderr.write(`\n${sentence.replace(/\s*\n\s*/g, ' ')}\n`);
  if (['debug', 'trace'].includes(process.env.LOG_LEVEL ?? '') && error instanceof Error) process.stderr.write(`${error.stack ?? ''}\n`);
  if (error instanceof SetupFailure) return error.status;
  return known ? exitStatuses.wrongSetting : exitStatuses.unexpected;
}
