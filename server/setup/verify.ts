import { pathToFileURL } from 'node:url';
import { parseArgs } from 'node:util';
import type { Knex } from 'knex';
import { makePool } from '@/db/connection';
import { caseIdsToVerify } from '@/db/read-models/case-ids-to-verify';
import { verifyCase } from '@/db/read-models/verify-case';

const USAGE = 'Say which records: npm run verify -- --case ID, or npm run verify -- --all.';
const uuid = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/;

/** What to verify, or the sentence that says how to ask. */
type Request = { readonly caseId: string | null } | { readonly wrong: string };

/** Reads the command line. */
export function parseRequest(words: readonly string[]): Request {
  try {
    const { values } = parseArgs({ args: [...words], options: { case: { type: 'string' }, all: { type: 'boolean' } }, strict: true });
    if ((values.case === undefined) === (values.all !== true)) return { wrong: USAGE };
    if (values.case === undefined) return { caseId: null };
    const caseId = values.case.toLowerCase();
    return uuid.test(caseId) ? { caseId } : { wrong: `Case ${JSON.stringify(values.case)} is no case id; a UUID is allowed.` };
  } catch (error) {
    return { wrong: `${error instanceof Error ? error.message : String(error)} ${USAGE}` };
  }
}

/** Verifies one case or all, prints a sentence for each, and returns the exit status: 0 only when every one passed. */
export async function verifyRecords(feed: Knex, caseId: string | null, print: (line: string) => void): Promise<0 | 1> {
  const caseIds = caseId === null ? await caseIdsToVerify(feed) : [caseId];
  let entries = 0;
  let failed = 0;
  for (const id of caseIds) {
    const verdict = await verifyCase(feed, id);
    if (verdict.ok) {
      entries += verdict.count;
      print(`Case ${id}: verified, ${verdict.count} entries.`);
    } else {
      failed += 1;
      print(`Case ${id}: entry ${verdict.seq} is bad. ${verdict.problem}`);
    }
  }
  if (caseIds.length === 0) print('There are no cases to verify.');
  else print(failed === 0 ? `All verified: ${caseIds.length} cases, ${entries} entries.` : `${failed} of ${caseIds.length} cases failed.`);
  return failed === 0 ? 0 : 1;
}

async function main(): Promise<number> {
  const request = parseRequest(process.argv.slice(2));
  if ('wrong' in request) {
    console.error(request.wrong);
    return 2;
  }
  const url = process.env.DATABASE_URL_FEED;
  if (url === undefined || url === '') {
    console.error('DATABASE_URL_FEED is not set; it must be the address of the database role fascicle_feed.');
    return 2;
  }
  const feed = makePool(url, 1, 'fascicle verify');
  try {
    return await verifyRecords(feed, request.caseId, (line) => console.log(line));
  } catch (error) {
    console.error(`The records could not be read: ${error instanceof Error ? error.message : String(error)}`);
    return 2;
  } finally {
    await feed.destroy();
  }
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) process.exitCode = await main();
