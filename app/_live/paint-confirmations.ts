const answerWithinMs = 3000;
const retryMs = 1000;
const mostKept = 50;

/** What confirming needs. */
export interface PaintParts {
  request(body: unknown, timeoutMs: number): Promise<unknown>;
  isConnected(): boolean;
  /** Server-corrected now. */
  nowMs(): number;
  wait(ms: number): Promise<void>;
}

interface Confirmation {
  readonly caseId: string;
  readonly seq: number;
  readonly alertId: string | null;
  readonly paintedAt: string;
}

/** What this wall painted, said to the server until it answers; the time is that of the paint, not of the saying. */
export class PaintConfirmations {
  private open: readonly Confirmation[] = [];

  constructor(private readonly parts: PaintParts) {}

  add(caseId: string, seq: number, alertId: string | null): void {
    const confirmation = { caseId, seq, alertId, paintedAt: new Date(this.parts.nowMs()).toISOString() };
    this.open = [...this.open, confirmation].slice(-mostKept);
    void this.say(confirmation);
  }

  /** A new connection: everything without an answer is said again. */
  sendAgain(): void {
    for (const confirmation of this.open) void this.say(confirmation);
  }

  private async say(confirmation: Confirmation): Promise<void> {
    while (this.open.includes(confirmation) && this.parts.isConnected()) {
      const isAnswered = await this.parts.request(confirmation, answerWithinMs).then(
        (reply) => !isToBeSaidAgain(reply),
        () => false,
      );
      if (isAnswered) this.open = this.open.filter((one) => one !== confirmation);
      else await this.parts.wait(retryMs);
    }
  }
}

/** The server or its database met a fault, or was asked too often: nothing was noted. */
function isToBeSaidAgain(reply: unknown): boolean {
  return typeof reply === 'object' && reply !== null && 'code' in reply && reply.code === 'not-saved';
}
