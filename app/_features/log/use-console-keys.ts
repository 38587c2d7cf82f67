'use client';

import { useLogCase } from '@/app/_features/log/log-context';
import { useHotkeys, type Hotkeys } from '@/app/_features/log/use-hotkeys';
import { worstIncident } from '@/app/_features/log/worst-incident';

/** Keys of the console outside the run form: the open alert, steps, conditions, messages, and the list of keys. */
export function useConsoleKeys(areKeysOn: boolean, onProblem: (problem: string | null) => void, onHint: (hint: string) => void): void {
  const { state, give, openDialog } = useLogCase();
  const incident = worstIncident(state);
  const onAlert = (kind: 'told' | 'read-back' | 'action' | 'end') => () => {
    if (incident === null) onHint('No alert is open');
    else openDialog({ kind, alertId: incident.alertId });
  };
  const steps: Hotkeys = Object.fromEntries(
    state.plan.steps
      .filter((step) => step.hotkey !== null)
      .map((step) => [
        step.hotkey as string,
        () => void give({ name: 'log-step', stepId: step.id, label: null }).then((outcome) => onProblem(outcome.kind === 'refused' ? outcome.message : null)),
      ]),
  );
  useHotkeys(
    state.status === 'open'
      ? {
          ...steps,
          t: onAlert('told'),
          b: onAlert('read-back'),
          a: onAlert('action'),
          e: onAlert('end'),
          c: () => openDialog({ kind: 'condition', condition: 'train-of-four' }),
          o: () => openDialog({ kind: 'other-step' }),
          v: () => {
            const advice = state.advice.find((one) => one.confirmedAt === null);
            if (advice === undefined) onHint('No advice waits');
            else void give({ name: 'confirm-advice', adviceSeq: advice.seq, text: null }).then((outcome) => onProblem(outcome.kind === 'refused' ? outcome.message : null));
          },
          m: () => document.querySelector<HTMLElement>('[data-message]')?.focus(),
          '?': () => openDialog({ kind: 'keys' }),
        }
      : { '?': () => openDialog({ kind: 'keys' }) },
    areKeysOn,
    (key) => onHint(`Key ${key.toUpperCase()} not taken: a number is half typed. Leave its field first, with Tab`),
  );
}
