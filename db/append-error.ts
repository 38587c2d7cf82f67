/**
 * Why an append wrote nothing. `clash`: the number is taken, read the head and decide again. `repeat`: the command is
 * in the log already, look it up. `refused`: the database's guard found the entry wrong.
 * Told apart by `kind`, never by class: the pages' bundle has copies of its own.
 */
export class AppendError extends Error {
  constructor(
    readonly kind: 'clash' | 'repeat' | 'refused',
    message: string,
    cause: unknown,
  ) {
    super(message, { cause });
    this.name = 'AppendError';
  }
}

const UNIQUE_VIOLATION = '23505';
const CHECK_VIOLATION = '23514';

/** The database's answer to a failed append in the words of the house; anything else is handed back as it came. */
export function readAppendError(error: unknown): unknown {
  if (!(error instanceof Error)) return error;
  const { code, constraint } = error as Error & { code?: unknown; constraint?: unknown };
  if (code === UNIQUE_VIOLATION && constraint === 'entries_pkey') return new AppendError('clash', 'Another entry has this number.', error);
  if (code === UNIQUE_VIOLATION && constraint === 'entries_command_unique') return new AppendError('repeat', 'This command is in the log already.', error);
  if (code === UNIQUE_VIOLATION || code === CHECK_VIOLATION) return new AppendError('refused', error.message, error);
  return error;
}
