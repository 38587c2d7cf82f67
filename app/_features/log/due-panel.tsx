'use client';

import { dueTasks } from '@/app/_features/log/due-tasks';
import { useLogCase } from '@/app/_features/log/log-context';
import { Panel } from '@/app/_features/log/panel';
import { useNow } from '@/app/_live/use-now';

const mostShown = 7;

/** What has not been tested or measured, the most needed first. */
export function DuePanel() {
  const { state } = useLogCase();
  const nowMs = useNow(1000);
  const tasks = dueTasks(state, nowMs);
  const shown = tasks.slice(0, mostShown);
  return (
    <Panel title="Due">
      {tasks.length === 0 ? <p className="text-second">{state.phase === 'monitoring' ? 'Nothing is due now' : 'Tests are due once monitoring begins'}</p> : null}
      <ul>
        {shown.map((task) => (
          <li key={task.key} className="flex items-baseline justify-between gap-4 py-0.5">
            <span className={task.isNow ? 'font-bold' : ''}>{task.label}</span>
            <span className={task.isNow ? 'text-right font-bold whitespace-nowrap' : 'text-right text-second'}>{task.when}</span>
          </li>
        ))}
      </ul>
      {tasks.length > mostShown ? <p className="text-second">{`and ${tasks.length - mostShown} more`}</p> : null}
    </Panel>
  );
}
