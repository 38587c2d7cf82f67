import { parseArgs } from 'node:util';
import type { Knex } from 'knex';
import { caseIdsToVerify } from '@/db/read-models/case-ids-to-verify';
import { verifyCase } from '@/db/read-models/verify-case';

const USAGE = 'Say which records: npm run verify -- --case ID, or npm run verify -- --all.';
const uuid = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/;

/** What to verify (null: every case), or the sentence that says how to ask. */
export type VerifyRequest = { readonly kind: 'verify'; readonly caseId: string | null } | { readonly kind: 'wrong'; readonly sentence: string };

/** Reads the words after `npm run verify --`. */
export function readVerifyRequest(words: readonly string[]): VerifyRequest {
  try {
    const { values } = parseArgs({ args: [...words], options: { case: { type: 'string' }, all: { type: 'boolean' } }, strict: true });
    if ((values.case === undefined) === (values.all !== true)) return { kind: 'wrong', sentence: USAGE };
    if (values.case === undefined) return { kind: 'verify', caseId: null };
    const caseId = values.case.toLowerCase();
    if (uuid.test(caseId)) return { kind: 'verify', caseId };
    return { kind: 'wrong', sentence: `Case ${JSON.stringify(values.case)} is no case id; a UUID is allowed.` };
  } catch (error) {
    return { kind: 'wrong', sentence: `${error instanceof Error ? error.message.replace(/\.?$/, '.') : String(error)} ${USAGE}` };
  }
}

/** Verifies one case or all, prints a sentence for each, and answers whether every one passed. */
export async function verifyRecords(feed: Knex, caseId: string | null, print: (line: string) => void): Promise<boolean> {
  const caseIds = caseId === null ? await caseIdsToVerify(feed) : [caseId];
  let entries = 0;
  let failed = 0;
  for (const id of caseIds) {
    const verdict = await verifyCase(feed, id);
    if (verdict.ok) {
      entries += verdict.count;
      print(`Case ${id}: verified, ${verdict.count} ${verdict.count === 1 ? 'entry' : 'entries'}.`);
    } else {
      failed += 1;
      print(`Case ${id}: entry ${verdict.seq} is bad. ${verdict.problem}`);
    }
  }
  if (caseIds.length === 0) print('There are no cases to verify.');
  else print(failed === 0 ? `All verified. Cases: ${caseIds.length}. Entries: ${entries}.` : `Not verified: ${failed} of ${caseIds.length}.`);
  return failed === 0;
}
