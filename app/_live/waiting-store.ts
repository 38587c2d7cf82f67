import type { LiveDatabase } from '@/app/_live/live-database';
import type { WaitingCommand } from '@/app/_live/live-store';

/** Where commands wait until they are committed. Order is given here, once, for all tabs. */
export interface WaitingStore {
  readonly isDurable: boolean;
  /** Keeps a command; resolved only when it is on the disk. */
  add(command: Omit<WaitingCommand, 'order'>): Promise<WaitingCommand>;
  /** All waiting and refused commands of a person, in order. */
  list(personId: string): Promise<WaitingCommand[]>;
  replace(command: WaitingCommand): Promise<void>;
  remove(commandId: string): Promise<void>;
}

/** Waiting commands in IndexedDB: survive a reload, a crash and a sign-out. */
export function indexedWaitingStore(database: LiveDatabase): WaitingStore {
  // Strict: the browser answers only after the write left its own buffers.
  const write = () => database.transaction('waiting', 'readwrite', { durability: 'strict' });
  return {
    isDurable: true,
    add: async (command) => {
      const transaction = write();
      const order = await transaction.store.add(command);
      await transaction.done;
      return { ...command, order };
    },
    list: async (personId) => {
      const found = await database.getAllFromIndex('waiting', 'by-person', personId);
      return found.filter((one): one is WaitingCommand => one.order !== undefined).sort((one, other) => one.order - other.order);
    },
    replace: async (command) => {
      const transaction = write();
      // A command that another tab settled meanwhile must not come back.
      if ((await transaction.store.get(command.order)) !== undefined) await transaction.store.put(command);
      await transaction.done;
    },
    remove: async (commandId) => {
      const transaction = write();
      const order = await transaction.store.index('by-command').getKey(commandId);
      if (order !== undefined) await transaction.store.delete(order);
      await transaction.done;
    },
  };
}

/** Waiting commands in memory, where the browser keeps nothing. Lost on reload: the desk says so. */
export function memoryWaitingStore(): WaitingStore {
  let commands: WaitingCommand[] = [];
  let lastOrder = 0;
  return {
    isDurable: false,
    add: async (command) => {
      lastOrder += 1;
      const added = { ...command, order: lastOrder };
      commands = [...commands, added];
      return added;
    },
    list: async (personId) => commands.filter((one) => one.personId === personId),
    replace: async (command) => {
      commands = commands.map((one) => (one.commandId === command.commandId ? command : one));
    },
    remove: async (commandId) => {
      commands = commands.filter((one) => one.commandId !== commandId);
    },
  };
}
