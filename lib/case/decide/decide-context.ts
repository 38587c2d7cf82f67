/** When a command happened, when it arrived, and the role that gave it. */
export interface DecideContext {
  readonly eventAt: string;
  readonly nowMs: number;
  readonly role?: string | undefined;
}
