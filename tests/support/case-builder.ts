import type { CaseCommand, Refusal } from '@/lib/case/commands';
import type { CaseState } from '@/lib/case/case-state';
import type { EntryDraft, EntryKind } from '@/lib/case/entry-bodies';
import type { CasePlan } from '@/lib/case/plan';
import type { RunBody } from '@/lib/case/run-body';
import type { WireEntry } from '@/lib/contracts/http/replies';
import type { Reading } from '@/lib/response/reading';
import { applyEntry } from '@/lib/case/apply-entry';
import { decide } from '@/lib/case/decide';
import { dueTimers } from '@/lib/case/due-timers';
import { initialState } from '@/lib/case/initial-state';
import { chainEntries } from '@/lib/record/chain-entries';
import { EMPTY_HEAD, type ChainHead } from '@/lib/record/entry';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { theatreView } from '@/lib/text/theatre-view';
import type { TheatreView } from '@/lib/text/theatre-line';

const hospitalId = '018f0000-0000-7000-8000-00000000000a';
const caseId = '018f0000-0000-7000-8000-0000000000c1';
const author = { id: 'person-1', role: 'neurophysiologist', displayName: 'Neurophysiologist' };

/** Readings by channel: a number of µV alone keeps the baseline's onset. */
export type Readings = Readonly<Record<string, Reading>>;

/** What an order may say besides its command. */
export interface OrderOptions {
  readonly eventAt?: string;
  readonly role?: string;
}

/** The moment of a clock time on the day of the demo, UTC. */
export function clock(time: string): string {
  const [clockPart = '', fraction = '000'] = time.split('.');
  return `2027-03-14T${clockPart.length === 5 ? `${clockPart}:00` : clockPart}.${fraction}Z`;
}

/** A measured response; no onset or amplitude is "not read". */
export function measured(onsetMs: number | null, amplitudeUv: number | null, durationMs: number | null = null): Reading {
  return { kind: 'measured', onsetMs, amplitudeUv, durationMs };
}

/** No response, with the highest current tried. */
export function absent(highestIntensityMa: number): Reading {
  return { kind: 'absent', highestIntensityMa };
}

/**
 * A case played command by command through `decide`, committed with real numbers and hashes, folded by `applyEntry`.
 * Time stands still until `at` or `wait` moves it.
 */
export class CaseBuilder {
  state: CaseState = initialState(caseId);
  readonly entries: WireEntry[] = [];
  nowMs = Date.parse(clock('10:00'));
  private head: ChainHead = EMPTY_HEAD;
  private commandCount = 0;

  constructor(readonly plan: CasePlan = ulnarAtElbow) {}

  /** Sets the clock: "10:41:20". */
  at(time: string): this {
    this.nowMs = Date.parse(clock(time));
    return this;
  }

  /** Lets time pass, in ms. */
  wait(ms: number): this {
    this.nowMs += ms;
    return this;
  }

  /** Gives a command that must be accepted. Returns what was committed. */
  give(command: CaseCommand, options: OrderOptions = {}): readonly EntryDraft[] {
    const decision = this.ask(command, options);
    if (decision.kind === 'refused') throw new Error(`Refused: ${decision.refusal.message}`);
    this.commandCount += 1;
    this.commit(decision.drafts, options, `018f0000-0000-7000-8000-${String(this.commandCount).padStart(12, '0')}`);
    return decision.drafts;
  }

  /** Gives a command that must be refused. Nothing is committed. */
  refused(command: CaseCommand, options: OrderOptions = {}): Refusal {
    const decision = this.ask(command, options);
    if (decision.kind === 'accepted') throw new Error(`Accepted: ${decision.drafts.map((draft) => draft.kind).join(', ')}`);
    return decision.refusal;
  }

  /** Plays what has come due, as the server does each second. Returns the kinds committed. */
  timers(): readonly EntryKind[] {
    return dueTimers(this.state, this.nowMs).flatMap((timer) => {
      const decision = this.ask(timer.command, { eventAt: timer.eventAt });
      if (decision.kind === 'refused') return [];
      this.commit(decision.drafts, { eventAt: timer.eventAt }, timer.commandId);
      return decision.drafts.map((draft) => draft.kind);
    });
  }

  /** Logs a run and returns the kinds committed after its judgement. */
  run(siteId: string, readings: Readings, changes: Partial<RunBody> = {}, options: OrderOptions = {}): readonly EntryKind[] {
    const drafts = this.give({ name: 'log-run', run: this.runBody(siteId, readings, changes) }, options);
    return drafts.map((draft) => draft.kind).filter((kind) => kind !== 'run.logged' && kind !== 'run.judged');
  }

  /** Body of a run at the site's usual current, supramaximal, with the plan's first electrode. */
  runBody(siteId: string, readings: Readings, changes: Partial<RunBody> = {}): RunBody {
    const site = this.state.plan.nerves.flatMap((nerve) => nerve.sites).find((candidate) => candidate.id === siteId);
    return {
      siteId,
      electrodeId: this.state.plan.electrodes[0]!.id,
      family: this.state.plan.defaultFamily,
      purpose: 'check',
      intensityMa: site?.defaultIntensityMa ?? 20,
      pulseWidthUs: this.state.plan.defaultPulseWidthUs,
      isSupramaximal: true,
      maximalResponseMa: null,
      readings: Object.entries(readings).map(([channelId, reading]) => ({ channelId, reading })),
      note: null,
      ...changes,
    };
  }

  step(stepId: string, options: OrderOptions = {}): void {
    this.give({ name: 'log-step', stepId, label: null }, options);
  }

  /** The same case from here on, played another way. */
  fork(): CaseBuilder {
    const other = new CaseBuilder(this.plan);
    other.entries.push(...this.entries);
    return Object.assign(other, { state: this.state, nowMs: this.nowMs, head: this.head, commandCount: this.commandCount });
  }

  view(nowMs = this.nowMs): TheatreView {
    return theatreView(this.state, nowMs, 'UTC');
  }

  /** The newest entry's number. */
  get seq(): number {
    return this.state.seq;
  }

  private ask(command: CaseCommand, options: OrderOptions) {
    const eventAt = options.eventAt ?? new Date(this.nowMs).toISOString();
    return decide(this.state, command, { eventAt, nowMs: this.nowMs, role: options.role ?? author.role });
  }

  private commit(drafts: readonly EntryDraft[], { eventAt, role }: OrderOptions, commandId: string): void {
    const recordedAt = new Date(this.nowMs).toISOString();
    const by = role === undefined ? author : { id: `person-${role}`, role, displayName: role };
    const unchained = drafts.map(({ kind, kindVersion, body }, commandPart) => {
      const commandDigest = 'ab'.repeat(32);
      return { hospitalId, caseId, kind, kindVersion, commandId, commandPart, commandDigest, eventAt: eventAt ?? recordedAt, recordedAt, author: by, body };
    });
    for (const { entry, hash } of chainEntries(this.head, unchained)) {
      const wire: WireEntry = { ...structuredClone(entry), hash };
      this.entries.push(wire);
      this.state = applyEntry(this.state, wire);
      this.head = { seq: entry.seq, hash, recordedAt: entry.recordedAt };
    }
  }
}
