import { fsyncSync, openSync, writeSync } from 'node:fs';
import { v7 as newId } from 'uuid';

import { envelope, runCommand } from '@/tests/server/house/client';

/*
 * A writer in a process of its own. Before it sends a command it writes "sent <id>" to its journal and flushes it; after
 * the server's acknowledgement it writes "acknowledged <id> <number>". It repeats the same id until it is answered.
 * Arguments: address, cookie, case id, journal file.
 */
const [url = '', cookie = '', caseId = '', journalPath = ''] = process.argv.slice(2);
const sites = ['axilla', 'above-elbow', 'below-elbow', 'wrist'];
const journal = openSync(journalPath, 'a');
let isStopping = false;
process.on('SIGTERM', () => {
  isStopping = true;
});

function note(line: string): void {
  writeSync(journal, `${line}\n`);
  fsyncSync(journal);
}

async function send(body: string): Promise<number | null> {
  try {
    const response = await fetch(`${url}/api/cases/${caseId}/commands`, {
      method: 'POST',
      headers: { origin: url, cookie, 'content-type': 'application/json' },
      body,
      signal: AbortSignal.timeout(10_000),
    });
    if (response.status !== 200) return null;
    const reply = (await response.json()) as { kind: string; entries: { seq: number }[] };
    return reply.kind === 'committed' ? (reply.entries[0]?.seq ?? null) : null;
  } catch {
    return null;
  }
}

for (let count = 0; !isStopping; count += 1) {
  const request = { ...envelope(runCommand(sites[count % sites.length] ?? 'wrist')), commandId: newId() };
  const body = JSON.stringify(request);
  note(`sent ${request.commandId}`);
  let seq = await send(body);
  while (seq === null) {
    await new Promise((resolve) => setTimeout(resolve, 50));
    seq = await send(body);
  }
  note(`acknowledged ${request.commandId} ${seq}`);
}
