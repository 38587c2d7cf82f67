const windowLength = 60;

/**
 * The server's clock, measured from pulses. A pulse can only arrive late, so the largest of the newest 60 differences
 * is the nearest to the truth; a single late pulse never moves it and therefore shows its own age.
 */
export class ServerClock {
  private samples: number[] = [];
  private remembered: number | null = null;

  /** Server clock minus browser clock, ms; 0 as long as nothing was measured. */
  get offsetMs(): number {
    return this.samples.length > 0 ? Math.max(...this.samples) : (this.remembered ?? 0);
  }

  get isMeasured(): boolean {
    return this.samples.length > 0 || this.remembered !== null;
  }

  /** Takes one pulse: the database's time in it and the browser's time of its arrival. */
  take(checkedAtMs: number, receivedAtMs: number): void {
    this.samples = [...this.samples, checkedAtMs - receivedAtMs].slice(-windowLength);
  }

  /** Uses an offset measured before a reload until the first pulse. */
  remember(offsetMs: number): void {
    if (this.samples.length === 0) this.remembered = offsetMs;
  }

  /** Forgets the window, for a new connection: nothing on it can be older than itself. Keeps the last offset until a pulse comes. */
  restart(): void {
    if (this.samples.length > 0) this.remembered = this.offsetMs;
    this.samples = [];
  }
}
