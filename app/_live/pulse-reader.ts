import type { Link } from '@/app/_live/live-store';
import { ServerClock } from '@/app/_live/server-clock';
import { pulseMessageSchema, type PulseMessage } from '@/lib/contracts/channel/messages';

/** A check of the database older than this counts as no pulse. */
export const liveForMs = 3000;
const reconnectAfterMs = 5000;

/** What reading pulses needs. */
export interface PulseParts {
  nowMs(): number;
  publish(change: Partial<Link>): void;
  /** A pulse young enough to count. */
  fresh(pulse: PulseMessage): void;
  /** Pulses come, and all of them were old for 5 s: the connection or a clock is at fault, and a new one measures again. */
  alwaysStale(): void;
}

/** Reads pulses: measures the server's clock and passes on only those whose database check is young. */
export class PulseReader {
  readonly clock = new ServerClock();
  private staleSinceMs: number | null = null;
  private lastCheckedAtMs = -Infinity;

  constructor(private readonly parts: PulseParts) {}

  read(body: unknown): void {
    const read = pulseMessageSchema.safeParse(body);
    if (!read.success) return;
    const nowMs = this.parts.nowMs();
    const checkedAtMs = Date.parse(read.data.checkedAt);
    if (Number.isNaN(checkedAtMs)) return;
    this.clock.take(checkedAtMs, nowMs);
    const ageMs = nowMs + this.clock.offsetMs - checkedAtMs;
    if (ageMs >= liveForMs) {
      this.noteStale(nowMs);
      return;
    }
    this.staleSinceMs = null;
    // An answer that was given before proves nothing new.
    if (checkedAtMs <= this.lastCheckedAtMs) return;
    this.lastCheckedAtMs = checkedAtMs;
    this.parts.publish({ lastCheckedAt: read.data.checkedAt, lastPulseAtMs: nowMs, offsetMs: this.clock.offsetMs, isOffsetMeasured: true });
    this.parts.fresh(read.data);
  }

  /** A new connection. */
  restart(): void {
    this.clock.restart();
    this.staleSinceMs = null;
    this.lastCheckedAtMs = -Infinity;
  }

  /** An offset from before a reload, until the first pulse. */
  remember(offsetMs: number): void {
    this.clock.remember(offsetMs);
    if (this.clock.isMeasured) this.parts.publish({ offsetMs: this.clock.offsetMs, isOffsetMeasured: true });
  }

  private noteStale(nowMs: number): void {
    this.staleSinceMs ??= nowMs;
    if (nowMs - this.staleSinceMs < reconnectAfterMs) return;
    this.staleSinceMs = null;
    this.parts.alwaysStale();
  }
}
