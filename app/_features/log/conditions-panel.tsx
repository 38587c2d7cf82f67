'use client';

import { useLogCase } from '@/app/_features/log/log-context';
import type { ConditionKind } from '@/app/_features/log/log-dialog';
import { Panel } from '@/app/_features/log/panel';
import { useNow } from '@/app/_live/use-now';
import { conditionWords } from '@/lib/text/condition-words';
import { durationWords } from '@/lib/text/format';
import { msOfMoment } from '@/lib/units/ms-of-moment';

const usual: readonly { readonly kind: ConditionKind; readonly name: string }[] = [
  { kind: 'train-of-four', name: 'Train-of-four' },
  { kind: 'tourniquet', name: 'Tourniquet' },
  { kind: 'limb-temperature', name: 'Limb skin' },
  { kind: 'mean-pressure', name: 'Mean pressure' },
];

/** The newest of each condition with its age; what was never measured says so. */
export function ConditionsPanel() {
  const { state } = useLogCase();
  const nowMs = useNow(1000);
  const others = Object.keys(state.conditions)
    .filter((kind) => !usual.some((row) => row.kind === kind))
    .map((kind) => ({ kind: kind as ConditionKind, name: '' }));
  return (
    <Panel title="Conditions">
      <table className="w-full">
        <caption className="sr-only">Conditions with their ages</caption>
        <tbody>
          {[...usual, ...others].map(({ kind, name }) => {
            const kept = state.conditions[kind];
            const words = kept === undefined ? null : conditionWords(kept.condition);
            return (
              <tr key={kind} className="align-baseline">
                <th scope="row" className="py-0.5 pr-2 text-left font-normal whitespace-nowrap text-second">{words?.name ?? name}</th>
                <td className="py-0.5 text-right font-mono text-[0.85rem] tracking-tight break-words">{words?.value ?? '–'}</td>
                <td className="py-0.5 pl-2 text-right text-sm whitespace-nowrap text-second">{kept === undefined ? 'not measured' : durationWords(nowMs - msOfMoment(kept.at))}</td>
              </tr>
            );
          })}
        </tbody>
      </table>
    </Panel>
  );
}
