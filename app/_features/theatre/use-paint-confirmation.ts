'use client';

import { useEffect } from 'react';

import { painted } from '@/app/_live/painted';
import type { CaseState } from '@/lib/case/case-state';
import type { TheatreView } from '@/lib/text/theatre-line';

/** Notices and alerts that stand on the wall, by their ids. */
function shownAlertIds(state: CaseState, view: TheatreView): readonly string[] {
  return [view.lead, ...view.others]
    .filter((line) => line.kind === 'alert' || line.kind === 'notice')
    .map((line) => (line.nerveId === null ? undefined : state.incidents[line.nerveId]?.alertId))
    .filter((alertId) => alertId !== undefined);
}

/** Tells the log what this wall has painted: each new state once, each alert in it by name. Nothing while covered. */
export function usePaintConfirmation(state: CaseState, view: TheatreView, isLive: boolean): void {
  const { caseId, seq } = state;
  const alerts = shownAlertIds(state, view).join(' ');
  useEffect(() => {
    if (!isLive || seq === 0) return;
    for (const alertId of alerts === '' ? [null] : alerts.split(' ')) painted(caseId, seq, alertId);
  }, [caseId, seq, alerts, isLive]);
}
