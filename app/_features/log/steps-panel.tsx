'use client';

import type { ReactNode } from 'react';

import { useLogCase } from '@/app/_features/log/log-context';
import { Panel } from '@/app/_features/log/panel';
import { Button } from '@/app/_ui/button';
import type { StepDefinition } from '@/lib/alert/nerve-plan';
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
    <Panel title="Step and condition" isPinned action={last === undefined ? null : <span className="text-sm text-second">{`${last.since}, ${clockTime(last.at, timeZone)}`}</span>}>
      <StepButtons steps={state.plan.steps.filter((step) => !step.isRisk)} isOff={isOff} onLog={log}>
        <Button isWide hotkey="C" disabled={isOff} onClick={() => openDialog({ kind: 'condition', condition: 'train-of-four' })} className={stepClasses}>Condition</Button>
      </StepButtons>
      <h3 className="mt-1.5 mb-1 text-sm text-second">Risk step: every test before it is old</h3>
      <StepButtons steps={state.plan.steps.filter((step) => step.isRisk)} isOff={isOff} onLog={log}>
        <Button isWide hotkey="O" disabled={isOff} onClick={() => openDialog({ kind: 'other-step' })} className={stepClasses}>Other step</Button>
      </StepButtons>
    </Panel>
  );
}

const stepClasses = 'gap-1.5! px-2! text-left text-sm! leading-4!';

interface StepButtonsProps {
  readonly steps: readonly StepDefinition[];
  readonly isOff: boolean;
  readonly onLog: (stepId: string) => Promise<void>;
  readonly children?: ReactNode;
}

function StepButtons({ steps, isOff, onLog, children }: StepButtonsProps) {
  return (
    <div className="grid grid-cols-2 gap-1.5">
      {steps.map((step) => (
        <Button key={step.id} isWide hotkey={step.hotkey?.toUpperCase()} disabled={isOff} onClick={() => void onLog(step.id)} className={stepClasses}>
          {step.label}
        </Button>
      ))}
      {children}
    </div>
  );
}
