import type { KeptSession } from '@/app/_live/live-database';
import type { LiveStorage } from '@/app/_live/live-storage';
import type { DeskSession } from '@/app/_live/live-store';

/** What the server says about who is signed in. */
export type SessionAnswer = { readonly kind: 'person'; readonly personId: string; readonly displayName: string } | { readonly kind: 'nobody' | 'no-answer' };
export type AskSession = () => Promise<SessionAnswer>;

const askAgainMs = 2000;
const keepOffsetEveryMs = 30_000;

/** What knowing the person needs. */
export interface IdentityParts {
  readonly ask: AskSession;
  readonly storage: Pick<LiveStorage, 'readSession' | 'writeSession' | 'forgetReadings'>;
  publish(session: DeskSession): void;
  personChanged(personId: string | null): Promise<void>;
  wait(ms: number): Promise<void>;
}

/** Who works at this desk: asked from the server at start and on every new connection, remembered for a start without a link. */
export class DeskIdentity {
  personId: string | null = null;
  /** True when this connection was asked and answered for `personId`; only then may commands go out. */
  isConfirmed = false;
  private displayName = '';
  private started: Promise<KeptSession | null> | null = null;
  private round = 0;
  /** Counts sign-outs: an answer that was asked for before one is nobody's. */
  private generation = 0;
  private offsetKeptAt = -Infinity;

  constructor(private readonly parts: IdentityParts) {}

  /** Asks once per tab; resolves with what was remembered from before. */
  start(): Promise<KeptSession | null> {
    this.started ??= this.begin();
    return this.started;
  }

  /** Asks for this connection until there is an answer. */
  async confirm(isStillConnected: () => boolean): Promise<void> {
    this.round += 1;
    const { round } = this;
    await this.start();
    while (isStillConnected() && round === this.round) {
      const answer = await this.parts.ask();
      if (round !== this.round) return;
      if (answer.kind !== 'no-answer') {
        await this.take(answer);
        // Another person reconnects: the new connection is then asked again.
        this.isConfirmed = answer.kind === 'person' && round === this.round && isStillConnected();
        return;
      }
      await this.parts.wait(askAgainMs);
    }
  }

  unconfirm(): void {
    this.round += 1;
    this.isConfirmed = false;
  }

  /** Signed out: nobody works here. */
  async forget(): Promise<void> {
    this.unconfirm();
    this.generation += 1;
    this.started = null;
    this.personId = null;
    this.parts.publish({ status: 'signed-out' });
    await this.parts.personChanged(null);
  }

  /** Keeps the measured offset now and then, for a start without a link. */
  keepOffset(offsetMs: number): void {
    const nowMs = performance.now();
    if (this.personId === null || nowMs - this.offsetKeptAt < keepOffsetEveryMs) return;
    this.offsetKeptAt = nowMs;
    void this.parts.storage.writeSession({ personId: this.personId, displayName: this.displayName, offsetMs }).catch(() => undefined);
  }

  private async begin(): Promise<KeptSession | null> {
    const { generation } = this;
    const kept = await this.parts.storage.readSession().catch(() => null);
    const answer = await this.parts.ask();
    if (generation !== this.generation) return null;
    if (answer.kind !== 'no-answer') await this.take(answer, kept);
    else if (kept !== null) {
      this.personId = kept.personId;
      this.displayName = kept.displayName;
      this.parts.publish({ status: 'unconfirmed', personId: kept.personId, displayName: kept.displayName });
      await this.parts.personChanged(kept.personId);
    }
    return kept;
  }

  private async take(answer: Exclude<SessionAnswer, { kind: 'no-answer' }>, kept: KeptSession | null = null): Promise<void> {
    if (answer.kind !== 'person') {
      // The session ended by itself: what was logged still waits for the same person in this tab.
      this.parts.publish({ status: 'signed-out' });
      return;
    }
    const { personId, displayName } = answer;
    const { generation } = this;
    const before = this.personId ?? kept?.personId ?? null;
    if (before !== null && before !== personId) await this.parts.storage.forgetReadings().catch(() => undefined);
    if (generation !== this.generation) return;
    const isNew = this.personId !== personId;
    this.personId = personId;
    this.displayName = displayName;
    const offsetMs = kept?.personId === personId ? kept.offsetMs : null;
    if (isNew) await this.parts.storage.writeSession({ personId, displayName, offsetMs }).catch(() => undefined);
    if (generation !== this.generation) return;
    this.parts.publish({ status: 'signed-in', personId, displayName });
    if (isNew) await this.parts.personChanged(personId);
  }
}
