import type { CommandReply } from '@/lib/contracts/http/replies';

/** What tabs of one browser tell each other. */
export type TabMessage =
  | { readonly kind: 'waiting-changed'; readonly personId: string }
  | { readonly kind: 'settled'; readonly personId: string; readonly commandId: string; readonly caseId: string; readonly reply: CommandReply }
  | { readonly kind: 'signed-out' };

/** Word from tab to tab. */
export interface TabChannel {
  tell(message: TabMessage): void;
  hear(listener: (message: TabMessage) => void): void;
}

/** The browser's own channel; silent where there is none. */
export function broadcastTabChannel(name = 'fascicle-live'): TabChannel {
  const channel = typeof BroadcastChannel === 'undefined' ? null : new BroadcastChannel(name);
  return {
    tell: (message) => channel?.postMessage(message),
    hear: (listener) => channel?.addEventListener('message', (event: MessageEvent<TabMessage>) => listener(event.data)),
  };
}

/** Runs work while no other holder of the same name runs. */
export type ExclusiveLock = <Result>(name: string, work: () => Promise<Result>) => Promise<Result>;

/** The browser's lock over all tabs; inside this tab only where the browser has none (plain http in a network). */
export function browserLock(): ExclusiveLock {
  if (typeof navigator !== 'undefined' && 'locks' in navigator) {
    return (name, work) => navigator.locks.request(name, work) as ReturnType<typeof work>;
  }
  return queueLock();
}

/** A lock among its own callers: one after the other, in the order of asking. */
export function queueLock(): ExclusiveLock {
  const last = new Map<string, Promise<unknown>>();
  return (name, work) => {
    const result = (last.get(name) ?? Promise.resolve()).then(work, work);
    last.set(name, result.catch(() => undefined));
    return result;
  };
}
