import { holdPresence } from '@/db/repositories/presence/hold-presence';
import type { Presence } from '@/server/cases/presence';
import type { ServerContext } from '@/server/server-context';

/** Tells other processes who is connected to this one. */
export interface PresenceKeeper {
  /** Writes what is true now. Called while it writes, it writes once more. */
  hold(): Promise<void>;
}

/** One statement at a time. A process at which nobody is says so once and is then silent. */
export function makePresenceKeeper({ database }: Pick<ServerContext, 'database'>, presence: Presence): PresenceKeeper {
  let holding: Promise<void> | null = null;
  let isBehind = false;
  let isSaidEmpty = true;

  async function holdUntilTrue(): Promise<void> {
    while (isBehind) {
      isBehind = false;
      const held = presence.held();
      if (held.length === 0 && isSaidEmpty) continue;
      isSaidEmpty = false;
      await holdPresence(database.app, presence.processId, held);
      isSaidEmpty = held.length === 0;
    }
  }

  return {
    hold() {
      isBehind = true;
      holding ??= holdUntilTrue().finally(() => {
        holding = null;
      });
      return holding;
    },
  };
}
