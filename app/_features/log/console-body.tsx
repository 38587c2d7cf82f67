'use client';

import { useState } from 'react';

import { AlertBlocks } from '@/app/_features/log/alert-block';
import { ConditionsPanel } from '@/app/_features/log/conditions-panel';
import { DuePanel } from '@/app/_features/log/due-panel';
import { useLogCase } from '@/app/_features/log/log-context';
import { LogTable } from '@/app/_features/log/log-table';
import { MessagesPanel } from '@/app/_features/log/messages-panel';
import { NervePanel } from '@/app/_features/log/nerve-panel';
import { RunForm } from '@/app/_features/log/run-form';
import { SetUpBar } from '@/app/_features/log/set-up-bar';
import { StepsPanel } from '@/app/_features/log/steps-panel';
import { useConsoleKeys } from '@/app/_features/log/use-console-keys';
import { Button } from '@/app/_ui/button';

/** Left the nerve, the next run and the log; right what is open, due and known, controls first: they never scroll away. */
export function ConsoleBody({ areKeysOn }: { readonly areKeysOn: boolean }) {
  const { state, head } = useLogCase();
  const [problem, setProblem] = useState<string | null>(null);
  const [hint, setHint] = useState<string | null>(null);
  useConsoleKeys(areKeysOn, setProblem, setHint);
  const isRunning = state.status === 'open' && head.mayWrite;
  return (
    <div onKeyDownCapture={() => setHint(null)} className="grid min-h-0 flex-1 grid-cols-1 overflow-y-auto lg:grid-cols-[minmax(0,1fr)_21rem] lg:overflow-hidden xl:grid-cols-[minmax(0,1fr)_23rem]">
      <div className="flex min-w-0 flex-col lg:min-h-0">
        <SetUpBar onProblem={setProblem} />
        {problem === null ? null : (
          <div role="alert" className="flex items-center justify-between gap-4 border-b border-rule px-5 py-1.5 font-semibold">
            <p>{`Not logged: ${problem}`}</p>
            <Button onClick={() => setProblem(null)}>Read</Button>
          </div>
        )}
        {hint === null ? null : <p role="status" className="border-b border-rule px-5 py-2 font-semibold">{hint}</p>}
        <NervePanel />
        {isRunning ? <RunForm areKeysOn={areKeysOn} /> : null}
        <LogTable />
      </div>
      <aside aria-label="State of the case" className="flex min-w-0 flex-col border-rule lg:min-h-0 lg:border-l">
        <AlertBlocks />
        <div className="min-h-20 flex-1 lg:overflow-y-auto">
          <DuePanel />
          <ConditionsPanel />
          <MessagesPanel />
        </div>
        <StepsPanel onProblem={setProblem} />
      </aside>
    </div>
  );
}
