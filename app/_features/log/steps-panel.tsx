'use client';

import { useLogCase } from '@/app/_features/log/log-context';
import { Panel } from '@/app/_features/log/panel';
import { Button } from '@/app/_ui/button';
import { clockTime } from '@/lib/text/format';

/** Surgical steps, one key each. A risk step is named so: after it every test is old. */
export function StepsPanel({ onProblem }: { readonly onProblem: (problem: string | null) => void }) {
  const { state, head, timeZone, give, openDialog } = useLogCase();
  const last = state.steps.at(-1);
  const isOff = state.status !== 'open' || !head.mayWrite;
  const log = async (stepId: string) => {
    const outcome = await give({ name: 'log-step', stepId, label: null });
    onProblem(outcome.kind === 'refused' ? outcome.message : null);
  };
  return (
    <Panel title="Step" action={last === undefined ? null : <span className="text-sm text-second">{`${last.since}, ${clockTime(last.at, timeZone)}`}</span>}>
      <div className="grid grid-cols-2 gap-1.5">
        {state.plan.steps.map((step) => (
          <Button key={step.id} isWide hotkey={step.hotkey?.toUpperCase()} disabled={isOff} onClick={() => void log(step.id)} className="text-left leading-4">
            {step.label}
            {step.isRisk ? <span className="block text-xs font-normal text-second">risk step</span> : null}
          </Button>
        ))}
        <Button isWide hotkey="O" disabled={isOff} onClick={() => openDialog({ kind: 'other-step' })} className="text-left">Other step</Button>
      </div>
    </Panel>
  );
}
