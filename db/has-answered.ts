/** Whether a query failed with the database's own word. Then the database is there, and another query may still be answered. */
export function hasAnswered(error: unknown): boolean {
  return error instanceof Error && 'code' in error && typeof error.code === 'string' && /^[0-9A-Z]{5}$/.test(error.code);
}
