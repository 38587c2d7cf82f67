import { readCommandReply } from '@/app/_live/read-command-reply';
import type { WaitingCommand } from '@/app/_live/live-store';
import type { ExclusiveLock, TabChannel } from '@/app/_live/tabs';
import type { WaitingStore } from '@/app/_live/waiting-store';
import type { CommandReply, WireEntry } from '@/lib/contracts/http/replies';

const answerWithinMs = 5000;
const firstRetryMs = 250;
const lastRetryMs = 5000;
/** How long a command that can leave at once stays unshown, so that drawing it does not hold up its sending. */
const sendFirstMs = 40;

/** What the queue needs of its surroundings. */
export interface QueueParts {
  readonly store: WaitingStore;
  readonly lock: ExclusiveLock;
  readonly tabs: TabChannel;
  request(body: unknown, timeoutMs: number): Promise<unknown>;
  /** Connected, and the connection is known to be this person's. */
  isReady(): boolean;
  /** Server clock minus browser clock; null when it was never measured. */
  offsetMs(): number | null;
  publish(waiting: readonly WaitingCommand[]): void;
  /** The server committed entries: show them. */
  committed(caseId: string, entries: readonly WireEntry[]): void;
  wait(ms: number): Promise<void>;
}

/** A command as the desk gives it. `atMs` is on the browser's clock plus `offsetMs`. */
export type NewWaitingCommand = Pick<WaitingCommand, 'commandId' | 'caseId' | 'eventAt' | 'offsetMs' | 'isOffsetMeasured' | 'command'>;

/**
 * Commands of one person on their way to the log: kept first, then sent one at a time and in order for each case, by one
 * tab, with the same id until the server answers. Gone only when committed; a refusal stays until its author dismisses
 * it, and holds nothing up.
 */
export class WaitingQueue {
  private personId: string | null = null;
  private commands: readonly WaitingCommand[] = [];
  private readonly gone = new Set<string>();
  private readonly asked = new Set<string>();
  private readonly draining = new Set<string>();
  private readonly settled = new Map<string, (reply: CommandReply) => void>();
  private readonly leaving = new Map<string, () => void>();

  constructor(private readonly parts: QueueParts) {
    parts.tabs.hear((message) => {
      if (message.kind === 'signed-out' || message.personId !== this.personId) return;
      if (message.kind === 'settled') this.tellAuthor(message.commandId, message.caseId, message.reply);
      void this.reload();
    });
  }

  get person(): string | null {
    return this.personId;
  }

  /** Shows and sends the commands of this person from now on; nobody's with null. */
  async setPerson(personId: string | null): Promise<void> {
    if (this.personId === personId) return;
    this.personId = personId;
    await this.reload();
  }

  /** Keeps a command, then tries to send it. Resolves when it is kept. */
  async add(command: NewWaitingCommand): Promise<void> {
    if (this.personId === null) throw new Error('Not signed in: sign in to log entries');
    const added = await this.parts.store.add({ ...command, personId: this.personId, status: 'waiting', refusal: null });
    const left = new Promise<void>((tell) => this.leaving.set(added.commandId, tell));
    void this.drainCase(added.caseId);
    if (this.parts.isReady()) await Promise.race([left, this.parts.wait(sendFirstMs)]);
    this.leaving.delete(added.commandId);
    this.showAdded(added);
    this.parts.tabs.tell({ kind: 'waiting-changed', personId: added.personId });
  }

  private showAdded(added: WaitingCommand): void {
    const isKnown = this.gone.has(added.commandId) || this.commands.some((one) => one.commandId === added.commandId);
    if (!isKnown && added.personId === this.personId) this.show([...this.commands, added]);
  }

  /** The reply of a command, once there is one. Ask before adding. */
  whenSettled(commandId: string): Promise<CommandReply> {
    return new Promise((resolve) => this.settled.set(commandId, resolve));
  }

  /** Sends what waits, case by case. */
  drain(): void {
    for (const caseId of new Set(this.commands.map((one) => one.caseId))) void this.drainCase(caseId);
  }

  /** Removes a refused command that its author has read. */
  async dismiss(commandId: string): Promise<void> {
    const command = this.commands.find((one) => one.commandId === commandId);
    if (command?.status !== 'refused') return;
    await this.forget(command);
  }

  /** Committed entries seen in the feed: as good as the reply, which may be lost. */
  noteCommitted(caseId: string, entries: readonly WireEntry[]): void {
    for (const command of this.commands) {
      const own = entries.filter((entry) => entry.commandId === command.commandId);
      if (own.length === 0 || command.caseId !== caseId) continue;
      this.settled.get(command.commandId)?.({ kind: 'committed', caseId, entries: own });
      this.settled.delete(command.commandId);
      void this.forget(command);
    }
  }

  private async drainCase(caseId: string): Promise<void> {
    this.asked.add(caseId);
    if (this.draining.has(caseId)) return;
    this.draining.add(caseId);
    let retryMs = firstRetryMs;
    while (this.asked.delete(caseId)) {
      const outcome = await this.parts.lock(`fascicle-waiting ${this.personId} ${caseId}`, () => this.sendFirst(caseId)).catch(() => 'retry' as const);
      if (outcome === 'none') continue;
      this.asked.add(caseId);
      if (outcome === 'sent') retryMs = firstRetryMs;
      if (outcome === 'retry') {
        await this.parts.wait(retryMs);
        retryMs = Math.min(retryMs * 2, lastRetryMs);
      }
    }
    this.draining.delete(caseId);
  }

  private async sendFirst(caseId: string): Promise<'none' | 'sent' | 'retry'> {
    if (this.personId === null || !this.parts.isReady()) return 'none';
    const waiting = await this.parts.store.list(this.personId);
    const first = waiting.find((one) => one.caseId === caseId && one.status === 'waiting' && !this.gone.has(one.commandId));
    if (first === undefined) return 'none';
    const { commandId, eventAt, command } = await this.withServerTime(first);
    // The person or the link may have changed while the store was read.
    if (first.personId !== this.personId || !this.parts.isReady()) return 'none';
    const asked = this.parts.request({ caseId, commandId, eventAt, command }, answerWithinMs);
    this.leaving.get(commandId)?.();
    const answer = await asked.catch(() => null);
    const reply = readCommandReply(answer);
    if (reply === null) return 'retry';
    await this.settle(first, reply);
    return 'sent';
  }

  /** A command given before the offset was ever measured gets the server's time once, before it is first sent. */
  private async withServerTime(command: WaitingCommand): Promise<WaitingCommand> {
    const offsetMs = this.parts.offsetMs();
    if (command.isOffsetMeasured || offsetMs === null) return command;
    const eventAt = new Date(Date.parse(command.eventAt) + offsetMs).toISOString();
    const corrected = { ...command, eventAt, offsetMs, isOffsetMeasured: true };
    await this.parts.store.replace(corrected);
    return corrected;
  }

  private async settle(command: WaitingCommand, reply: CommandReply): Promise<void> {
    const { commandId, caseId, personId } = command;
    if (reply.kind === 'refused') await this.parts.store.replace(refused(command, reply));
    this.tellAuthor(commandId, caseId, reply);
    if (reply.kind === 'committed') await this.forget(command);
    this.parts.tabs.tell({ kind: 'settled', personId, commandId, caseId, reply });
    await this.reload();
  }

  private tellAuthor(commandId: string, caseId: string, reply: CommandReply): void {
    // Entries first: the committed state replaces the provisional one in the same breath.
    if (reply.kind === 'committed') this.parts.committed(caseId, reply.entries);
    else this.show(this.commands.map((one) => (one.commandId === commandId ? refused(one, reply) : one)));
    this.settled.get(commandId)?.(reply);
    this.settled.delete(commandId);
  }

  private async forget(command: WaitingCommand): Promise<void> {
    this.gone.add(command.commandId);
    this.show(this.commands.filter((one) => one.commandId !== command.commandId));
    await this.parts.store.remove(command.commandId);
    this.parts.tabs.tell({ kind: 'waiting-changed', personId: command.personId });
  }

  private async reload(): Promise<void> {
    const { personId } = this;
    const found = personId === null ? [] : await this.parts.store.list(personId);
    if (personId === this.personId) this.show(found.filter((one) => !this.gone.has(one.commandId)));
  }

  private show(commands: readonly WaitingCommand[]): void {
    const byOrder = [...new Map(commands.map((one) => [one.order, one])).values()].sort((one, other) => one.order - other.order);
    this.commands = byOrder;
    this.parts.publish(byOrder);
  }
}

function refused(command: WaitingCommand, { code, message, field }: Extract<CommandReply, { kind: 'refused' }>): WaitingCommand {
  return { ...command, status: 'refused', refusal: { code, message, field } };
}
