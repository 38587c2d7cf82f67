import { v7 as uuidv7 } from 'uuid';

import { CaseFollower } from '@/app/_live/case-follower';
import { DeskIdentity, type AskSession } from '@/app/_live/desk-identity';
import { readCommand, type GivenCommand } from '@/app/_live/read-command';
import type { LiveSocket, OpenSocket, SocketListener, Viewer } from '@/app/_live/live-socket';
import type { LiveStorage } from '@/app/_live/live-storage';
import { emptyFeed, emptyLiveStore, type CaseFeed, type LiveStore } from '@/app/_live/live-store';
import { PaintConfirmations } from '@/app/_live/paint-confirmations';
import { PulseReader } from '@/app/_live/pulse-reader';
import type { ExclusiveLock, TabChannel } from '@/app/_live/tabs';
import { WaitingQueue } from '@/app/_live/waiting-queue';
import { endedMessageSchema, entriesMessageSchema, type PulseMessage } from '@/lib/contracts/channel/messages';
import type { CommandReply, WireEntry } from '@/lib/contracts/http/replies';

const replyWithinMs = 4000;
/** Longer than a page takes to follow the case that the page before released. */
const leaveAfterMs = 1000;

/** What the client stands on; all of it is injected. */
export interface LiveClientParts {
  readonly openSocket: OpenSocket;
  readonly storage: LiveStorage;
  readonly lock: ExclusiveLock;
  readonly tabs: TabChannel;
  readonly askSession: AskSession;
  nowMs(): number;
  readonly store: { getState(): LiveStore; setState(change: Partial<LiveStore> | ((held: LiveStore) => Partial<LiveStore>)): void };
}

/** A reply of the server, or word that the command is kept and waits. */
export type SendOutcome = (CommandReply | { readonly kind: 'waiting' }) & {
  /** Null when the command broke the contract and was not kept. */
  readonly commandId: string | null;
};

const wait = (ms: number) => new Promise<void>((resolve) => setTimeout(resolve, ms));

/** The one live client of a tab: one connection, its cases, the waiting commands of its person. */
export class LiveClient {
  readonly queue: WaitingQueue;
  readonly identity: DeskIdentity;
  private socket: LiveSocket | null = null;
  private viewer: Viewer | null = null;
  private readonly followers = new Map<string, { readonly follower: CaseFollower; readonly viewer: Viewer; uses: number }>();
  private readonly pulses: PulseReader;
  private readonly paints: PaintConfirmations;

  constructor(private readonly parts: LiveClientParts) {
    this.queue = new WaitingQueue({
      store: parts.storage.waiting,
      lock: parts.lock,
      tabs: parts.tabs,
      request: (body, timeoutMs) => this.request('command', body, timeoutMs),
      isReady: () => this.isConnected() && this.identity.isConfirmed,
      offsetMs: () => (this.pulses.clock.isMeasured ? this.pulses.clock.offsetMs : null),
      publish: (waiting) => parts.store.setState({ waiting }),
      committed: (caseId, entries) => this.followers.get(caseId)?.follower.receive(entries),
      wait,
    });
    this.identity = new DeskIdentity({
      ask: parts.askSession,
      storage: parts.storage,
      publish: (session) => parts.store.setState({ session }),
      personChanged: (personId) => this.personChanged(personId),
      wait,
    });
    this.pulses = new PulseReader({
      nowMs: () => parts.nowMs(),
      publish: (change) => parts.store.setState((held) => ({ link: { ...held.link, ...change } })),
      fresh: (pulse) => this.spreadPulse(pulse),
      alwaysStale: () => this.socket?.reconnect(),
    });
    this.paints = new PaintConfirmations({ request: (body, timeoutMs) => this.request('painted', body, timeoutMs), isConnected: () => this.isConnected(), nowMs: () => this.nowMs(), wait });
    parts.tabs.hear((message) => {
      if (message.kind === 'signed-out') void this.leaveDesk();
    });
    parts.store.setState({ isStorageDurable: parts.storage.waiting.isDurable });
  }

  /** Server-corrected now. */
  nowMs(): number {
    return this.parts.nowMs() + this.pulses.clock.offsetMs;
  }

  /** Who sits here, and what of theirs waits. For every page of the desk, also those that follow no case. */
  async startDesk(): Promise<void> {
    const remembered = await this.identity.start();
    if (remembered?.offsetMs != null) this.pulses.remember(remembered.offsetMs);
    if (this.hasWaiting()) this.connect();
  }

  /** Follows a case until the returned function is called. */
  follow(caseId: string, viewer: Viewer): () => void {
    const held = this.followers.get(caseId);
    if (held !== undefined) held.uses += 1;
    else void this.begin(caseId, viewer);
    return () => this.release(caseId);
  }

  /** Keeps a command, sends it in order, and answers with the server's reply or with "waiting". */
  async send(caseId: string, command: GivenCommand, atMs: number = this.nowMs()): Promise<SendOutcome> {
    const read = readCommand(command);
    if (read.kind === 'refused') return { ...read, commandId: null };
    const { isMeasured, offsetMs } = this.pulses.clock;
    const commandId = uuidv7();
    const settled = this.queue.whenSettled(commandId);
    await this.queue.add({ commandId, caseId, eventAt: new Date(atMs).toISOString(), offsetMs, isOffsetMeasured: isMeasured, command: read.command });
    this.connect();
    if (!this.isConnected()) return { kind: 'waiting', commandId };
    const outcome = await Promise.race([settled, wait(replyWithinMs).then(() => ({ kind: 'waiting' as const }))]);
    return { ...outcome, commandId };
  }

  /** Confirms to the server that this wall painted an entry. */
  painted(caseId: string, seq: number, alertId: string | null): void {
    this.paints.add(caseId, seq, alertId);
  }

  /** Drops the connection and everything of the person from this tab; the waiting commands stay in the browser. */
  async signOut(): Promise<void> {
    await this.leaveDesk();
    await this.parts.storage.forgetReadings();
    this.parts.tabs.tell({ kind: 'signed-out' });
  }

  private async leaveDesk(): Promise<void> {
    if (this.viewer === 'wall') return;
    this.disconnect();
    for (const { follower } of this.followers.values()) follower.stop();
    this.followers.clear();
    this.parts.store.setState({ feeds: {} });
    await this.identity.forget();
  }

  private async begin(caseId: string, viewer: Viewer): Promise<void> {
    const follower = this.makeFollower(caseId, viewer);
    this.followers.set(caseId, { follower, viewer, uses: 1 });
    this.publishFeed(caseId, emptyFeed);
    if (viewer !== 'wall') {
      await this.startDesk();
      await this.restore(caseId, follower);
    }
    if (this.followers.get(caseId)?.follower !== follower) return;
    this.connect();
    void follower.follow();
  }

  private makeFollower(caseId: string, viewer: Viewer): CaseFollower {
    return new CaseFollower({
      caseId,
      keepsEntries: viewer !== 'wall',
      request: (body, timeoutMs) => this.request('follow', body, timeoutMs),
      isConnected: () => this.isConnected(),
      publish: (change) => this.publishFeed(caseId, change),
      applied: (entries) => this.keep(caseId, viewer, entries),
      wait,
    });
  }

  private async restore(caseId: string, follower: CaseFollower): Promise<void> {
    const { personId } = this.identity;
    if (personId === null) return;
    const entries = await this.parts.storage.kept.read(personId, caseId).catch(() => []);
    // A kept copy that is no chain is of no use; the server has the log.
    if (!follower.restore(entries)) await this.parts.storage.kept.forget(personId, caseId).catch(() => undefined);
  }

  private keep(caseId: string, viewer: Viewer, entries: readonly WireEntry[]): void {
    if (viewer === 'wall') return;
    this.queue.noteCommitted(caseId, entries);
    const { personId } = this.identity;
    // Keeping is a convenience for a reload without a link: a full disk must not end the feed.
    if (personId !== null) void this.parts.storage.kept.keep(personId, caseId, entries).catch(() => undefined);
  }

  private release(caseId: string): void {
    const held = this.followers.get(caseId);
    if (held === undefined) return;
    held.uses -= 1;
    if (held.uses > 0) return;
    held.follower.stop();
    this.followers.delete(caseId);
    this.parts.store.setState(({ feeds }) => ({ feeds: Object.fromEntries(Object.entries(feeds).filter(([id]) => id !== caseId)) }));
    setTimeout(() => this.leave(caseId), leaveAfterMs);
  }

  /** The channel has no word for leaving one case: a new connection leaves it, and is present only where it should be. */
  private leave(caseId: string): void {
    if (this.followers.has(caseId) || this.socket === null) return;
    this.disconnect();
    if (this.followers.size > 0 || this.hasWaiting()) this.connect();
  }

  /** Connects as what is needed now: a desk if any case is followed as one. */
  private connect(): void {
    const viewers = [...this.followers.values()].map((held) => held.viewer);
    const viewer = viewers.find((one) => one === 'desk') ?? viewers[0] ?? 'follow';
    if (this.socket !== null && (this.viewer === viewer || viewers.length === 0)) return;
    this.disconnect();
    this.viewer = viewer;
    this.socket = this.parts.openSocket(viewer, this.listener());
  }

  private disconnect(): void {
    this.socket?.close();
    this.socket = null;
    this.viewer = null;
    this.disconnected();
  }

  private disconnected(): void {
    this.identity.unconfirm();
    this.parts.store.setState((held) => ({ link: { ...held.link, isConnected: false } }));
  }

  private hasWaiting(): boolean {
    return this.parts.store.getState().waiting.some((one) => one.status === 'waiting');
  }

  private listener(): SocketListener {
    return {
      connected: () => void this.connected(),
      disconnected: () => this.disconnected(),
      received: (event, body) => {
        if (event === 'pulse') this.pulses.read(body);
        if (event === 'entries') this.receiveEntries(body);
        if (event === 'ended') this.receiveEnd(body);
      },
    };
  }

  private async connected(): Promise<void> {
    this.pulses.restart();
    this.parts.store.setState((held) => ({ link: { ...held.link, isConnected: true } }));
    for (const { follower } of this.followers.values()) follower.reconnected();
    this.paints.sendAgain();
    if (this.viewer === 'wall') return;
    await this.identity.confirm(() => this.isConnected());
    this.queue.drain();
  }

  private receiveEntries(body: unknown): void {
    const read = entriesMessageSchema.safeParse(body);
    if (read.success) this.followers.get(read.data.caseId)?.follower.receive(read.data.entries);
    else for (const { follower } of this.followers.values()) void follower.follow();
  }

  private receiveEnd(body: unknown): void {
    const read = endedMessageSchema.safeParse(body);
    if (read.success) this.followers.get(read.data.caseId)?.follower.end(read.data.reason);
  }

  private spreadPulse(pulse: PulseMessage): void {
    for (const [caseId, { follower }] of this.followers) {
      const ofCase = pulse.cases.find((one) => one.caseId === caseId);
      if (ofCase === undefined) void follower.follow();
      else follower.pulse(ofCase, pulse.checkedAt);
    }
    this.identity.keepOffset(this.pulses.clock.offsetMs);
  }

  /** Another person at this browser: nothing of the one before may stay on the screen, and nothing go out in their name. */
  private async personChanged(personId: string | null): Promise<void> {
    const isAnother = this.queue.person !== null && this.queue.person !== personId;
    await this.queue.setPerson(personId);
    // What came before the person was known is kept now: a log without its beginning cannot be shown again.
    for (const [caseId, { viewer }] of isAnother ? [] : this.followers) this.keep(caseId, viewer, this.parts.store.getState().feeds[caseId]?.entries ?? []);
    if (!isAnother) return;
    this.parts.store.setState({ feeds: {}, link: { ...emptyLiveStore.link, isConnected: this.isConnected() } });
    for (const [caseId, held] of this.followers) {
      held.follower.stop();
      this.followers.set(caseId, { ...held, follower: this.makeFollower(caseId, held.viewer) });
      this.publishFeed(caseId, emptyFeed);
    }
    this.socket?.reconnect();
  }

  private request(event: 'follow' | 'command' | 'painted', body: unknown, timeoutMs: number): Promise<unknown> {
    return this.socket?.request(event, body, timeoutMs) ?? Promise.reject(new Error('No link to the server'));
  }

  private isConnected(): boolean {
    return this.socket?.isConnected ?? false;
  }

  private publishFeed(caseId: string, change: Partial<CaseFeed>): void {
    if (!this.followers.has(caseId)) return;
    this.parts.store.setState(({ feeds }) => ({ feeds: { ...feeds, [caseId]: { ...(feeds[caseId] ?? emptyFeed), ...change } } }));
  }
}
