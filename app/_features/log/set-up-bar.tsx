'use client';

import { useLogCase } from '@/app/_features/log/log-context';
import { useLiveStore } from '@/app/_live/live-store';
import { Button } from '@/app/_ui/button';
import { actionNames } from '@/lib/text/action-names';
import { clockTime } from '@/lib/text/format';

/** From opening to closing: what is needed before monitoring, and what changes the case as a whole. */
export function SetUpBar({ onProblem }: { readonly onProblem: (problem: string | null) => void }) {
  const { state, head, timeZone, give, openDialog } = useLogCase();
  if (!head.mayWrite || state.status === 'closed') return <ClosedBar />;
  const open = async () => {
    const { offsetMs, isOffsetMeasured } = useLiveStore.getState().link;
    const outcome = await give({ name: 'open-case', clockOffsetMs: isOffsetMeasured ? offsetMs : null });
    onProblem(outcome.kind === 'refused' ? outcome.message : null);
  };
  // A patient is examined before the work at the nerve and after it.
  const isExamined = state.status === 'planned' || state.phase === 'set-up' || state.phase === 'take-down';
  const patient = [head.patientLabel, head.recordNumber].filter((text) => text !== null).join(', ');
  return (
    <div className="flex min-h-12 shrink-0 flex-wrap items-center gap-2 border-b border-rule px-5 py-1.5">
      {state.status === 'planned' ? (
        <Button variant="primary" onClick={() => void open()}>{actionNames.openCase}</Button>
      ) : (
        <>
          {state.timeoutAt === null ? (
            <Button variant="primary" onClick={() => openDialog({ kind: 'timeout' })}>{actionNames.timeout}</Button>
          ) : (
            <span className="px-1 text-sm text-second">{`Time-out ${clockTime(state.timeoutAt, timeZone)}`}</span>
          )}
          <Button onClick={() => openDialog({ kind: 'phase' })}>{actionNames.phase}</Button>
          <Button onClick={() => openDialog({ kind: 'baseline' })}>{actionNames.baseline}</Button>
          <Button onClick={() => openDialog({ kind: 'distances', nerveId: state.plan.nerves[0]?.id ?? '' })}>{actionNames.distances}</Button>
          <Button onClick={() => openDialog({ kind: 'pair' })}>Pair a wall</Button>
          <Button onClick={() => openDialog({ kind: 'close' })}>{actionNames.closeCase}</Button>
        </>
      )}
      {isExamined ? <Button onClick={() => openDialog({ kind: 'examination' })}>{actionNames.examination}</Button> : null}
      <Button hotkey="?" onClick={() => openDialog({ kind: 'keys' })}>Keys</Button>
      <span className="ml-auto text-sm text-second">{patient}</span>
    </div>
  );
}

function ClosedBar() {
  const { caseId, state } = useLogCase();
  return (
    <div className="flex min-h-12 shrink-0 flex-wrap items-center gap-4 border-b border-rule px-5 py-1.5">
      <span className="font-semibold">{state.status === 'closed' ? 'Case closed. Not monitored.' : 'Log, read only'}</span>
      <a href={`/cases/${caseId}/record`} className="inline-flex min-h-9 items-center font-semibold text-stain underline underline-offset-4">Record</a>
    </div>
  );
}
