import { findCommand } from '@/db/repositories/entries/find-command';
import { insertEntries } from '@/db/repositories/entries/insert-entries';
import { insertSnapshot } from '@/db/repositories/snapshots/insert-snapshot';
import type { CaseCommand } from '@/lib/case/commands';
import { decide } from '@/lib/case/decide';
import type { EntryDraft } from '@/lib/case/entry-bodies';
import type { CommandReply } from '@/lib/contracts/http/replies';
import { chainEntries, type UnchainedEntry } from '@/lib/record/chain-entries';
import type { Author, SealedEntry } from '@/lib/record/entry';
import type { KeptCase } from '@/server/cases/kept-case';
import { isSnapshotDue, writeSnapshot } from '@/server/cases/state-snapshot';
import { toWireEntry } from '@/server/cases/to-wire-entry';
import { notSaved } from '@/server/failure';
import type { ServerContext } from '@/server/server-context';

/** A command whose author was let in by the policy. */
export interface AllowedCommand {
  readonly caseId: string;
  readonly hospitalId: string;
  readonly commandId: string;
  /** Over everything that two sendings of one command share. */
  readonly commandDigest: string;
  readonly eventAt: string;
  readonly author: Author;
  readonly command: CaseCommand;
}

/**
 * Each round reads the log again, so a round is lost only to somebody else's entry. A process that writes without pause has
 * its own state at hand and can win many rounds in a row against one that must read first.
 */
const mostRounds = 200;

/**
 * Decides a command and appends what it gives: one INSERT, answered after its commit. The cached case may be behind: that
 * is safe where a row is appended, because the number is then taken; before any answer that appends nothing it is
 * caught up and decided again.
 */
export function appendCommand(context: ServerContext, given: AllowedCommand): Promise<CommandReply> {
  return context.queue.run(given.caseId, async () => {
    try {
      return await decideAndAppend(context, given);
    } catch (cause) {
      context.memory.evict(given.caseId);
      context.log.error({ err: cause, caseId: given.caseId, commandId: given.commandId }, 'A command was not saved.');
      throw notSaved();
    }
  });
}

async function decideAndAppend(context: ServerContext, given: AllowedCommand): Promise<CommandReply> {
  let kept = await context.memory.load(given.caseId);
  let isCaughtUp = false;
  for (let round = 0; round < mostRounds; round += 1) {
    const decision = decide(kept.state, given.command, { eventAt: given.eventAt, nowMs: context.nowMs(), role: given.author.role });
    const hasNothing = decision.kind === 'refused' || decision.drafts.length === 0;
    if (hasNothing && !isCaughtUp) {
      kept = await context.memory.catchUp(given.caseId);
      isCaughtUp = true;
      continue;
    }
    if (hasNothing) return (await repeatReply(context, given)) ?? refusedReply(decision);
    const outcome = await append(context, given, kept, decision.drafts);
    if (outcome.kind === 'answered') return outcome.reply;
    kept = await context.memory.catchUp(given.caseId);
    isCaughtUp = true;
  }
  throw new Error(`Case ${given.caseId} grew ${mostRounds} times while one command was decided.`);
}

type Outcome = { readonly kind: 'answered'; readonly reply: CommandReply } | { readonly kind: 'clash' };

async function append(context: ServerContext, given: AllowedCommand, kept: KeptCase, drafts: readonly EntryDraft[]): Promise<Outcome> {
  const sealed = chainEntries(kept.head, drafts.map((draft, part) => unchained(context, given, kept, draft, part)));
  try {
    await insertEntries(context.database.app, sealed);
  } catch (cause) {
    return afterFailedAppend(context, given, cause);
  }
  return { kind: 'answered', reply: remember(context, given, kept, sealed) };
}

/** The entries are in the log: nothing after this line may turn the answer into a failure. */
function remember(context: ServerContext, given: AllowedCommand, kept: KeptCase, sealed: readonly SealedEntry[]): CommandReply {
  const entries = sealed.map(toWireEntry);
  try {
    const next = context.memory.add(given.caseId, kept, sealed);
    if (isSnapshotDue(kept.head.seq, next.head.seq)) keepSnapshot(context, given.hospitalId, next);
    context.onCommitted(given.caseId, entries);
  } catch (cause) {
    context.memory.evict(given.caseId);
    context.log.error({ err: cause, caseId: given.caseId }, 'An entry is saved but could not be told to viewers; they read it by their poll.');
  }
  return { kind: 'committed', caseId: given.caseId, entries };
}

async function afterFailedAppend(context: ServerContext, given: AllowedCommand, cause: unknown): Promise<Outcome> {
  const kind = cause instanceof Error && 'kind' in cause ? cause.kind : null;
  if (kind === 'clash') return { kind: 'clash' };
  // Either the command is in the log already, or the commit's answer was lost: the log says which.
  context.memory.evict(given.caseId);
  const reply = await repeatReply(context, given);
  if (reply === null) throw cause;
  return { kind: 'answered', reply };
}

/** The answer to a command that is in the log: what it wrote, or a refusal when it said something else then. */
export async function repeatReply(context: ServerContext, given: AllowedCommand): Promise<CommandReply | null> {
  const written = await findCommand(context.database.feed, given.caseId, given.commandId);
  if (written.length === 0) return null;
  if (written[0]?.entry.commandDigest === given.commandDigest) {
    const entries = written.map(toWireEntry);
    context.onCommitted(given.caseId, entries);
    return { kind: 'committed', caseId: given.caseId, entries };
  }
  const message = `Command id used twice: ${given.commandId} stands in the log with other content. Nothing was changed.`;
  return { kind: 'refused', code: 'command-id-used', message, field: 'commandId' };
}

function refusedReply(decision: ReturnType<typeof decide>): CommandReply {
  if (decision.kind === 'refused') return { kind: 'refused', code: decision.refusal.code, message: decision.refusal.message, field: null };
  return { kind: 'refused', code: 'nothing-to-do', message: 'Nothing to log: the case stands so already.', field: null };
}

function unchained(context: ServerContext, given: AllowedCommand, kept: KeptCase, draft: EntryDraft, part: number): UnchainedEntry {
  const now = new Date(context.nowMs()).toISOString();
  const before = kept.head.recordedAt;
  return {
    hospitalId: given.hospitalId,
    caseId: given.caseId,
    kind: draft.kind,
    kindVersion: draft.kindVersion,
    commandId: given.commandId,
    commandPart: part,
    commandDigest: given.commandDigest,
    eventAt: given.eventAt,
    // Another process's clock may be ahead; time in a log never goes back.
    recordedAt: before !== undefined && before > now ? before : now,
    author: given.author,
    body: draft.body as unknown as UnchainedEntry['body'],
  };
}

function keepSnapshot(context: ServerContext, hospitalId: string, kept: KeptCase): void {
  insertSnapshot(context.database.app, writeSnapshot(hospitalId, kept)).catch((cause: unknown) => {
    context.log.warn({ err: cause, caseId: kept.state.caseId }, 'A snapshot was not kept; the log is read instead.');
  });
}
