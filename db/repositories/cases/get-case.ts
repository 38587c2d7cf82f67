import type { Handle } from '@/db/connection';
import { findCase, type CaseRow } from './find-case';

/** The case; throws when there is none that this handle may see. */
export async function getCase(handle: Handle, caseId: string): Promise<CaseRow> {
  const found = await findCase(handle, caseId);
  if (found === null) throw new Error(`There is no case ${caseId}.`);
  return found;
}
