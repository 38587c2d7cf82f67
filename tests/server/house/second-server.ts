import { v7 as newId } from 'uuid';

import { makeDatabase, type Database } from '@/db/connection';
import type { CaseCommand } from '@/lib/case/commands';
import type { CommandReply } from '@/lib/contracts/http/replies';
import { commandDigest } from '@/lib/record/command-digest';
import { appendCommand } from '@/server/commands/append-command';
import { makeServerContext, type ContextParts } from '@/server/make-server-context';
import type { ServerContext } from '@/server/server-context';
import { createLogger } from '@/server/telemetry/create-logger';

import type { TestHouse } from './open-test-house';

/** What a second process on the same database would have: pools, a memory and a queue of its own. */
export interface SecondServer {
  readonly context: ServerContext;
  give(caseId: string, command: CaseCommand, commandId?: string): Promise<CommandReply>;
  close(): Promise<void>;
}

/** Opens one; `parts` stand in for its own, as a lying database or another clock. */
export function openSecondServer(house: TestHouse, parts: Partial<ContextParts> & { wrap?: (database: Database) => Database } = {}): SecondServer {
  const { appUrl, feedUrl, auditUrl, secret } = house.database;
  const own = makeDatabase({ app: appUrl, feed: feedUrl, audit: auditUrl });
  const { wrap = (database) => database, ...others } = parts;
  const context = makeServerContext({ database: wrap(own), log: createLogger({ level: 'silent' }), publicUrl: house.url, secret, isDemo: true, ...others });
  return {
    context,
    async give(caseId, command, commandId = newId()) {
      const { hospital_id: hospitalId } = await house.admin('cases').where({ id: caseId }).first('hospital_id');
      const author = { id: 'test', role: 'neurophysiologist', displayName: 'Neurophysiologist' };
      const eventAt = new Date(context.nowMs()).toISOString();
      return appendCommand(context, { caseId, hospitalId, commandId, commandDigest: commandDigest(command), eventAt, author, command });
    },
    close: () => own.close(),
  };
}
