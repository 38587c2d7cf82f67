'use client';

import { readCaseHead } from '@/app/_live/api';
import { ApiFailure } from '@/app/_live/api-failure';
import type { KeptCaseHead } from '@/app/_live/live-database';
import { useLiveStore, type DeskSession } from '@/app/_live/live-store';
import { tabStorage } from '@/app/_live/tab-client';
import type { CaseHeadReply } from '@/lib/contracts/http/replies';

/**
 * The head of a case. Without a link: the head as kept in this browser, which never holds the patient's label or number.
 * @throws {ApiFailure} when the server refuses, or is not reached and nothing is kept
 */
export async function loadCaseHead(caseId: string): Promise<CaseHeadReply> {
  const storage = await tabStorage();
  try {
    const head = await readCaseHead(caseId);
    void keepHead(head).catch(() => undefined);
    return head;
  } catch (cause) {
    if (!(cause instanceof ApiFailure) || cause.kind !== 'no-link') throw cause;
    const person = await storage.readSession();
    const kept = person === null ? null : await storage.readHead(person.personId, caseId);
    if (kept === null) throw cause;
    return { ...kept, patientLabel: null, recordNumber: null };
  }
}

/** Kept for the person at the desk, who may be known only after the head has come. */
async function keepHead(head: CaseHeadReply): Promise<void> {
  const session = await whenAnswered();
  if ('personId' in session) await (await tabStorage()).writeHead(session.personId, withoutPatient(head));
}

/** Who sits here, once it is known. */
function whenAnswered(): Promise<DeskSession> {
  const { session } = useLiveStore.getState();
  if (session.status !== 'unknown') return Promise.resolve(session);
  return new Promise((resolve) => {
    const unsubscribe = useLiveStore.subscribe((store) => {
      if (store.session.status === 'unknown') return;
      unsubscribe();
      resolve(store.session);
    });
  });
}

/** Field by field: what a later contract adds is not kept by itself. */
function withoutPatient({ caseId, hospitalId, hospitalName, timeZone, reference, role, mayWrite }: CaseHeadReply): KeptCaseHead {
  return { caseId, hospitalId, hospitalName, timeZone, reference, role, mayWrite };
}
