/** What a contract says of a value it does not take, as far as it is told on. */
export interface ContractIssue {
  readonly code?: string | undefined;
  readonly path: readonly PropertyKey[];
  readonly message: string;
  readonly keys?: readonly string[];
}

/** The first thing that a contract found wrong: the field by its path, and a sentence that says what is allowed. */
export function problemOf(issues: readonly ContractIssue[]): { field: string | null; message: string } {
  const issue = issues[0];
  if (issue === undefined) return { field: null, message: 'Not readable: the request has not the form that this server knows.' };
  const path = [...issue.path.map(String), ...(issue.code === 'unrecognized_keys' ? (issue.keys ?? []).slice(0, 1) : [])];
  // Names come from the sender: shown short, and without characters that a terminal would obey.
  const field = path.join('.').replace(/[^\x20-\x7e]/g, '?').slice(0, 120);
  const message = issue.message.replace(/[^\x20-\x7e\u00a0-\u024f\u2010-\u2030\u2212]/g, '?').slice(0, 300);
  return field === '' ? { field: null, message: `${message}.` } : { field, message: `${message} (${field}).` };
}
