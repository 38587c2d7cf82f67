'use client';

import { useLogCase } from '@/app/_features/log/log-context';
import { incidentHeadline } from '@/lib/text/incident-headline';

/** Which notice or alert a question is about, in words; empty once it has ended. */
export function useAlertHeadline(alertId: string): string {
  const { state } = useLogCase();
  const incident = Object.values(state.incidents).find((open) => open.alertId === alertId);
  return incident === undefined ? '' : `${incident.level === 'alert' ? 'Alert' : 'Notice'}: ${incidentHeadline(state, incident)}`;
}
