import { ask } from '@/app/_live/api';
import { screensReplySchema, type ScreenLine } from '@/lib/contracts/http/account';

/** The walls of a case. */
export async function readScreens(caseId: string): Promise<readonly ScreenLine[]> {
  return (await ask(`/api/cases/${caseId}/screens`, screensReplySchema)).screens;
}

/** Ends a wall at once; what is left. */
export async function revokeScreen(caseId: string, screenId: string): Promise<readonly ScreenLine[]> {
  return (await ask(`/api/cases/${caseId}/screens/${screenId}`, screensReplySchema, { method: 'DELETE' })).screens;
}
