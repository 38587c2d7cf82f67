'use client';

import { useLogCase } from '@/app/_features/log/log-context';
import { Panel } from '@/app/_features/log/panel';
import { useNow } from '@/app/_live/use-now';
import { conditionRows } from '@/lib/text/condition-rows';
import { durationWords } from '@/lib/text/format';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/** The newest of each condition with its age; what was never measured says so. */
export function ConditionsPanel() {
  const { state } = useLogCase();
  const nowMs = useNow(1000);
  return (
    <Panel title="Conditions">
      <table className="w-full">
        <caption className="sr-only">Conditions with their ages</caption>
        <tbody>
          {conditionRows(state.conditions).map(({ kind, name, value, at }) => (
            <tr key={kind} className="align-baseline">
              <th scope="row" className="py-0.5 pr-2 text-left font-normal whitespace-nowrap text-second">{name}</th>
              <td className="py-0.5 text-right font-mono text-[0.85rem] tracking-tight break-words">{value ?? '–'}</td>
              <td className="py-0.5 pl-2 text-right text-sm whitespace-nowrap text-second">{at === null ? 'not measured' : durationWords(nowMs - msOfMoment(at))}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </Panel>
  );
}
