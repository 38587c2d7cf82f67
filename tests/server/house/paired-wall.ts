import type { ScreenReply } from '@/lib/contracts/http/replies';

import { send } from './client';
import type { TestHouse } from './open-test-house';

/** A wall bound to a case by the person at its desk. */
export async function pairedWall(house: TestHouse, desk: string, caseId: string): Promise<{ cookie: string; screenId: string }> {
  const asked = await send(house, 'POST', '/api/screen');
  const { code, screenId } = asked.body as ScreenReply & { kind: 'waiting' };
  const cookie = (asked.headers.get('set-cookie') ?? '').split(';')[0] ?? '';
  const paired = await send(house, 'POST', `/api/cases/${caseId}/screens`, { cookie: await house.cookieOf(desk), body: { code, isConfirmed: true } });
  if (paired.status !== 200) throw new Error(`Pairing answered ${paired.status}`);
  return { cookie, screenId };
}
