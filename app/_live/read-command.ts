import type { CaseCommand } from '@/lib/case/commands';
import { personCommandSchema, type PersonCommand } from '@/lib/contracts/http/commands';
import type { CommandReply } from '@/lib/contracts/http/replies';

type Refused = Extract<CommandReply, { kind: 'refused' }>;

/** What a person may ask of a case that exists. */
export type GivenCommand = Exclude<CaseCommand, { readonly name: 'plan-case' | 'miss-repeat' }>;

/** Checks a command against the contract before it is kept: what the server could never take must not wait for it. */
export function readCommand(command: GivenCommand): { readonly kind: 'read'; readonly command: PersonCommand } | Refused {
  const read = personCommandSchema.safeParse(command);
  if (read.success) return { kind: 'read', command: read.data };
  const issue = read.error.issues[0];
  return {
    kind: 'refused',
    code: 'bad-request',
    message: issue?.message ?? 'Not readable: this command is not complete',
    field: issue === undefined || issue.path.length === 0 ? null : issue.path.join('.'),
  };
}
