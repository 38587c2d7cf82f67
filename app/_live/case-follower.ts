import { entryOrder } from '@/app/_live/entry-order';
import type { CaseFeed, FeedProblem } from '@/app/_live/live-store';
import { applyEntry } from '@/lib/case/apply-entry';
import type { CaseState } from '@/lib/case/case-state';
import { initialState } from '@/lib/case/initial-state';
import { followReplySchema, type EndedMessage, type FollowReply, type PulseMessage } from '@/lib/contracts/channel/messages';
import { contractVersion } from '@/lib/contracts/contract-version';
import type { WireEntry } from '@/lib/contracts/http/replies';

const rememberedHashes = 1000;
const shownEntries = 5000;
const answerWithinMs = 5000;
const firstRetryMs = 250;
const lastRetryMs = 2000;

/** What a follower needs of its surroundings. */
export interface FollowerParts {
  readonly caseId: string;
  /** Whether entries are shown as a list; a wall needs the state only. */
  readonly keepsEntries: boolean;
  request(body: unknown, timeoutMs: number): Promise<unknown>;
  isConnected(): boolean;
  publish(change: Partial<CaseFeed>): void;
  /** Called with newly applied entries before they are published. */
  applied(entries: readonly WireEntry[]): void;
  wait(ms: number): Promise<void>;
}

type PulseOfCase = PulseMessage['cases'][number];
type FollowPage = Extract<FollowReply, { kind: 'entries' }>;

/**
 * Follows one case: applies an entry only if its number is last + 1 and its previous hash is the hash held. Anything else
 * is asked again from last. The same number with another hash is a fork of the record and ends following.
 */
export class CaseFollower {
  private state: CaseState;
  private entries: readonly WireEntry[] = [];
  private hashes = new Map<number, string>();
  private arrivedMeanwhile: WireEntry[] = [];
  private isFollowing = false;
  private isStopped = false;
  private problem: FeedProblem | null = null;
  private lastPulse: { readonly pulse: PulseOfCase; readonly checkedAt: string } | null = null;

  constructor(private readonly parts: FollowerParts) {
    this.state = initialState(parts.caseId);
  }

  /** Number of the newest applied entry. */
  get seq(): number {
    return this.state.seq;
  }

  /** Applies entries kept from before a reload. Returns false when they do not make a chain. */
  restore(entries: readonly WireEntry[]): boolean {
    if (this.state.seq > 0) return true;
    return this.apply(entries) === 'all';
  }

  /** Asks for what comes after the newest applied entry, until there is no more. One question at a time. */
  async follow(): Promise<void> {
    if (this.isFollowing || this.isStopped || isLasting(this.problem)) return;
    this.isFollowing = true;
    let retryMs = firstRetryMs;
    while (this.mayAsk()) {
      const outcome = await this.askOnce();
      if (outcome === 'done') break;
      if (outcome === 'more') {
        retryMs = firstRetryMs;
        continue;
      }
      await this.parts.wait(retryMs);
      retryMs = Math.min(retryMs * 2, lastRetryMs);
    }
    this.isFollowing = false;
    this.takeArrived();
  }

  /** Entries that the server sent by itself. */
  receive(entries: readonly WireEntry[]): void {
    if (this.isStopped || this.problem !== null) return;
    if (this.apply(entries) === 'odd') {
      // What arrives while a question is open may overtake its answer.
      if (this.isFollowing) this.arrivedMeanwhile.push(...entries);
      else void this.follow();
    }
    this.confirmCheck();
  }

  /** A pulse that was not stale, with the head of this case. */
  pulse(pulse: PulseOfCase, checkedAt: string): void {
    const { deskConnected, deskSince, wallsConnected, peopleConnected } = pulse;
    this.lastPulse = { pulse, checkedAt };
    this.parts.publish({ deskConnected, deskSince, wallsConnected, peopleConnected, headSeq: Math.max(pulse.headSeq, this.state.seq) });
    if (pulse.headSeq > this.state.seq) void this.follow();
    else if (isOther(this.hashes.get(pulse.headSeq), pulse.headHash)) this.fail('fork');
    this.confirmCheck();
  }

  /** The server ended following, with its reason. */
  end(reason: EndedMessage['reason']): void {
    this.isStopped = true;
    this.lastPulse = null;
    this.parts.publish({ ended: reason });
  }

  /** A new connection: the old pulse proves nothing, and what was refused may be allowed now. */
  reconnected(): void {
    this.isStopped = false;
    this.lastPulse = null;
    if (!isLasting(this.problem)) this.problem = null;
    this.parts.publish({ problem: this.problem, ended: null });
    void this.follow();
  }

  stop(): void {
    this.isStopped = true;
  }

  private mayAsk(): boolean {
    return this.parts.isConnected() && !this.isStopped && !isLasting(this.problem);
  }

  private async askOnce(): Promise<'done' | 'more' | 'again'> {
    const after = this.state.seq;
    const answer = await this.parts
      .request({ contractVersion, caseId: this.parts.caseId, after }, answerWithinMs)
      .then((value) => followReplySchema.safeParse(value))
      .catch(() => null);
    if (answer === null || this.isStopped) return 'again';
    if (!answer.success) return this.fail('newer-version');
    const reply = answer.data;
    if (reply.kind === 'entries') return this.takePage(reply, after);
    if (reply.code === 'not-found' || reply.code === 'newer-version') return this.fail(reply.code);
    return 'again';
  }

  private takePage(page: FollowPage, after: number): 'done' | 'more' | 'again' {
    // A log that lost entries which were seen committed, or has another one under the same number, was rewritten.
    if (page.headSeq < after) return this.fail('fork');
    const first = page.entries[0];
    if (first !== undefined && entryOrder(this.state, undefined, first) === 'broken-link') return this.fail('fork');
    if (isOther(this.hashes.get(page.headSeq), page.headHash)) return this.fail('fork');
    if (this.apply(page.entries) === 'odd') return 'again';
    this.parts.publish({ headSeq: Math.max(page.headSeq, this.state.seq), ...(this.problem === 'not-found' ? { problem: null } : {}) });
    if (this.problem === 'not-found') this.problem = null;
    this.confirmCheck();
    return page.hasMore && page.entries.length > 0 ? 'more' : 'done';
  }

  private takeArrived(): void {
    const arrived = this.arrivedMeanwhile;
    this.arrivedMeanwhile = [];
    if (arrived.length > 0) this.receive(arrived);
    else if (this.lastPulse !== null && this.lastPulse.pulse.headSeq > this.state.seq && this.mayAsk()) void this.follow();
  }

  /** Applies what follows, passes over what is known. `odd`: something is missing or does not fit. */
  private apply(entries: readonly WireEntry[]): 'all' | 'odd' {
    const fresh: WireEntry[] = [];
    let outcome: 'all' | 'odd' = 'all';
    for (const entry of entries) {
      const order = entryOrder(this.state, this.hashes.get(entry.seq), entry);
      if (order === 'known') continue;
      if (order === 'fork') this.fail('fork');
      if (order !== 'next' || !this.evolve(entry)) {
        outcome = 'odd';
        break;
      }
      fresh.push(entry);
    }
    if (fresh.length > 0) this.publishApplied(fresh);
    return outcome;
  }

  private evolve(entry: WireEntry): boolean {
    try {
      this.state = applyEntry(this.state, entry);
    } catch (cause) {
      this.fail(cause instanceof Error && cause.name === 'UnknownKindError' ? 'newer-version' : 'unreadable');
      return false;
    }
    this.hashes.set(entry.seq, entry.hash);
    this.hashes.delete(entry.seq - rememberedHashes);
    return true;
  }

  private publishApplied(fresh: readonly WireEntry[]): void {
    if (this.parts.keepsEntries) this.entries = [...this.entries, ...fresh].slice(-shownEntries);
    const headSeq = Math.max(this.lastPulse?.pulse.headSeq ?? 0, this.state.seq);
    this.parts.applied(fresh);
    this.parts.publish({ state: this.state, entries: this.entries, headSeq });
  }

  /** A check counts for this case only when everything it saw is held here. */
  private confirmCheck(): void {
    if (this.lastPulse === null || this.problem !== null || this.isStopped) return;
    const { pulse, checkedAt } = this.lastPulse;
    if (this.state.seq > 0 && pulse.headSeq <= this.state.seq) this.parts.publish({ checkedAt });
  }

  private fail(problem: FeedProblem): 'done' {
    this.problem = problem;
    this.parts.publish({ problem });
    return 'done';
  }
}

const isLasting = (problem: FeedProblem | null): boolean => problem !== null && problem !== 'not-found';
const isOther = (held: string | undefined, told: string): boolean => held !== undefined && held !== told;
