import type { PersonCommand } from '@/lib/contracts/http/commands';

import { commit, planCaseAs, runCommand } from './client';
import type { TestHouse } from './open-test-house';

/** A case with a notice that waits for its repeat: a baseline, then a run at a fifth of its amplitude. */
export async function caseWithNotice(house: TestHouse, desk: string): Promise<string> {
  const caseId = await planCaseAs(house, desk);
  const commands: PersonCommand[] = [
    { name: 'open-case', clockOffsetMs: null },
    { name: 'confirm-timeout', side: 'left', text: null },
    { name: 'change-phase', phase: 'baseline', reason: null },
    ...Array.from({ length: 3 }, () => runCommand('wrist', 8_000, 'baseline')),
    { name: 'accept-baseline', family: 'exposed', electrodeId: 'surface', reason: 'No train-of-four at hand' },
    { name: 'change-phase', phase: 'monitoring', reason: null },
    runCommand('wrist', 1_600),
  ];
  for (const command of commands) await commit(house, desk, caseId, command);
  return caseId;
}
