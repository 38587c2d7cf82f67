'use client';

import { useFollowCase } from '@/app/_features/follow/follow-context';
import { conditionWords } from '@/lib/text/condition-words';
import { durationWords } from '@/lib/text/format';
import { msOfMoment } from '@/lib/units/ms-of-moment';

const usual = [
  { kind: 'train-of-four', name: 'Train-of-four' },
  { kind: 'tourniquet', name: 'Tourniquet' },
  { kind: 'limb-temperature', name: 'Limb skin' },
  { kind: 'mean-pressure', name: 'Mean pressure' },
] as const;

/** The newest of each condition with its age; what was never measured says so. */
export function ConditionList() {
  const { state, nowMs } = useFollowCase();
  const others = Object.keys(state.conditions).filter((kind) => !usual.some((row) => row.kind === kind)).map((kind) => ({ kind, name: '' }));
  return (
    <section aria-labelledby="conditions" className="min-w-0 py-1">
      <h2 id="conditions" className="mb-1 font-bold">Conditions</h2>
      <table className="w-full">
        <caption className="sr-only">Conditions with their ages</caption>
        <tbody>
          {[...usual, ...others].map(({ kind, name }) => {
            const kept = state.conditions[kind];
            const words = kept === undefined ? null : conditionWords(kept.condition);
            return (
              <tr key={kind} className="align-baseline">
                <th scope="row" className="py-0.5 pr-3 text-left font-normal whitespace-nowrap text-second">{words?.name ?? name}</th>
                <td className="py-0.5 text-right font-mono break-words">{words?.value ?? '–'}</td>
                <td className="py-0.5 pl-3 text-right text-[0.9em] whitespace-nowrap text-second">{kept === undefined ? 'not measured' : `${durationWords(nowMs - msOfMoment(kept.at))} ago`}</td>
              </tr>
            );
          })}
        </tbody>
      </table>
    </section>
  );
}
