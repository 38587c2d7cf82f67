import type { LiveSocket, OpenSocket, SocketListener, Viewer } from '@/app/_live/live-socket';
import { applyEntry } from '@/lib/case/apply-entry';
import type { CaseState } from '@/lib/case/case-state';
import type { CaseCommand } from '@/lib/case/commands';
import { decide } from '@/lib/case/decide';
import { initialState } from '@/lib/case/initial-state';
import { commandMessageSchema, followRequestSchema } from '@/lib/contracts/channel/messages';
import type { CommandReply, WireEntry } from '@/lib/contracts/http/replies';
import { chainEntries } from '@/lib/record/chain-entries';
import { EMPTY_HEAD } from '@/lib/record/entry';

const hospitalId = '018f0000-0000-7000-8000-00000000000a';

/** What the fake does with the next commands, in order; then it answers normally. */
export type Fault = 'lose-answer' | 'not-saved' | 'drop-connection';

/**
 * The server's side of the live channel over one case in memory, by the words of `lib/contracts/channel/messages`: decides
 * and chains with the real `lib`, a repeated id is answered with what was committed. Faults are asked for by name.
 */
export class FakeServer {
  readonly entries: WireEntry[] = [];
  readonly sockets: FakeSocket[] = [];
  /** Command ids in the order in which they arrived, repeats included. */
  readonly arrived: string[] = [];
  readonly eventTimes: string[] = [];
  readonly followed: number[] = [];
  readonly painted: unknown[] = [];
  commandsInFlight = 0;
  mostInFlight = 0;
  isUp = true;
  isSilent = false;
  pageSize = 500;
  faults: Fault[] = [];
  refuse: ((command: CaseCommand) => string | null) | null = null;
  nowMs: () => number = () => Date.now();
  author = { id: 'person-1', role: 'neurophysiologist', displayName: 'Neurophysiologist' };
  state: CaseState;

  constructor(readonly caseId: string, start: readonly WireEntry[] = []) {
    this.entries.push(...start);
    this.state = start.reduce(applyEntry, initialState(caseId));
  }

  readonly open: OpenSocket = (viewer, listener) => {
    const socket = new FakeSocket(this, viewer, listener);
    this.sockets.push(socket);
    queueMicrotask(() => socket.connect());
    return socket;
  };

  get head(): { headSeq: number; headHash: string } {
    return { headSeq: this.state.seq, headHash: this.state.hash };
  }

  /** Server stops: every connection is lost and none can be made. */
  stop(): void {
    this.isUp = false;
    for (const socket of this.sockets) socket.drop();
  }

  start(): void {
    this.isUp = true;
    for (const socket of this.sockets) socket.connect();
  }

  /** Commits a command of somebody else and tells the viewers. */
  commit(command: CaseCommand, commandId: string, eventAt = new Date(this.nowMs()).toISOString()): CommandReply {
    const known = this.entries.filter((entry) => entry.commandId === commandId);
    if (known.length > 0) return { kind: 'committed', caseId: this.caseId, entries: known };
    const decision = decide(this.state, command, { eventAt, nowMs: Date.parse(eventAt), role: this.author.role });
    if (decision.kind === 'refused') return { kind: 'refused', ...decision.refusal, field: null };
    const recordedAt = new Date(this.nowMs()).toISOString();
    const { caseId, author } = this;
    const drafts = decision.drafts.map(({ kind, kindVersion, body }, commandPart) => ({ hospitalId, caseId, kind, kindVersion, commandId, commandPart, commandDigest: 'ab'.repeat(32), eventAt, recordedAt, author, body }));
    const before = this.state.seq === 0 ? EMPTY_HEAD : { seq: this.state.seq, hash: this.state.hash };
    const entries = chainEntries(before, drafts).map(({ entry, hash }): WireEntry => structuredClone({ ...entry, hash }) as WireEntry);
    this.state = entries.reduce(applyEntry, this.state);
    this.entries.push(...entries);
    this.tell('entries', { caseId, entries });
    return { kind: 'committed', caseId, entries };
  }

  /** Sends to every follower, unless the fake is silent. */
  tell(event: 'entries' | 'pulse' | 'ended', body: unknown): void {
    if (this.isSilent) return;
    for (const socket of this.sockets) if (socket.isConnected && socket.isFollowing) socket.listener.received(event, structuredClone(body));
  }

  pulse(change: { checkedAt?: string; headSeq?: number; headHash?: string } = {}): void {
    const { checkedAt = new Date(this.nowMs()).toISOString(), ...head } = change;
    this.tell('pulse', { checkedAt, cases: [{ caseId: this.caseId, ...this.head, deskConnected: true, deskSince: null, wallsConnected: 1, peopleConnected: [], ...head }] });
  }

  async answer(socket: FakeSocket, event: string, body: unknown): Promise<unknown> {
    if (event === 'painted') {
      this.painted.push(body);
      return { kind: 'noted' };
    }
    if (event === 'follow') return this.answerFollow(socket, body);
    this.commandsInFlight += 1;
    this.mostInFlight = Math.max(this.mostInFlight, this.commandsInFlight);
    await new Promise((resolve) => setTimeout(resolve, 1));
    this.commandsInFlight -= 1;
    return this.answerCommand(socket, body);
  }

  private answerFollow(socket: FakeSocket, body: unknown): unknown {
    const { after, caseId } = followRequestSchema.parse(body);
    if (caseId !== this.caseId) return { kind: 'refused', code: 'not-found', message: 'Not found: there is no such case among yours.' };
    socket.isFollowing = true;
    this.followed.push(after);
    const rest = this.entries.filter((entry) => entry.seq > after);
    return { kind: 'entries', entries: rest.slice(0, this.pageSize), ...this.head, hasMore: rest.length > this.pageSize };
  }

  private answerCommand(socket: FakeSocket, body: unknown): unknown {
    const { commandId, command, eventAt } = commandMessageSchema.parse(body);
    this.arrived.push(commandId);
    this.eventTimes.push(eventAt);
    const fault = this.faults.shift();
    if (fault === 'not-saved') return { kind: 'refused', code: 'not-saved', message: 'Not saved: the database did not answer.', field: null };
    const message = this.refuse?.(command) ?? null;
    if (message !== null) return { kind: 'refused', code: 'bad-request', message, field: null };
    const isHeard = this.isSilent;
    // A lost answer is lost with its broadcast: the author must learn it by asking again.
    this.isSilent = isHeard || fault !== undefined;
    const reply = this.commit(command, commandId, eventAt);
    this.isSilent = isHeard;
    if (fault === 'drop-connection') socket.drop();
    if (fault !== undefined) throw new Error('The answer was lost');
    return reply;
  }
}

/** One connection to the fake. */
export class FakeSocket implements LiveSocket {
  isConnected = false;
  isFollowing = false;
  private isClosed = false;

  constructor(
    private readonly server: FakeServer,
    readonly viewer: Viewer,
    readonly listener: SocketListener,
  ) {}

  async request(event: 'follow' | 'command' | 'painted', body: unknown): Promise<unknown> {
    if (!this.isConnected) throw new Error('No link to the server');
    const answer = await this.server.answer(this, event, structuredClone(body));
    if (!this.isConnected) throw new Error('The connection was lost before the answer');
    return structuredClone(answer);
  }

  connect(): void {
    if (this.isConnected || this.isClosed || !this.server.isUp) return;
    this.isConnected = true;
    this.listener.connected();
  }

  drop(): void {
    if (!this.isConnected) return;
    this.isConnected = false;
    this.isFollowing = false;
    this.listener.disconnected();
  }

  reconnect(): void {
    this.drop();
    queueMicrotask(() => this.connect());
  }

  close(): void {
    this.isClosed = true;
    this.drop();
  }
}
