'use client';

import { useFollowCase } from '@/app/_features/follow/follow-context';
import { conditionRows } from '@/lib/text/condition-rows';
import { durationWords } from '@/lib/text/format';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/** The newest of each condition with its age; what was never measured says so. */
export function ConditionList() {
  const { state, nowMs } = useFollowCase();
  return (
    <section aria-labelledby="conditions" className="min-w-0 py-1">
      <h2 id="conditions" className="mb-1 font-bold">Conditions</h2>
      <table className="w-full">
        <caption className="sr-only">Conditions with their ages</caption>
        <tbody>
          {conditionRows(state.conditions).map(({ kind, name, value, at }) => (
            <tr key={kind} className="align-baseline">
              <th scope="row" className="py-0.5 pr-3 text-left font-normal whitespace-nowrap text-second">{name}</th>
              <td className="py-0.5 text-right font-mono break-words">{value ?? '–'}</td>
              <td className="py-0.5 pl-3 text-right text-[0.9em] whitespace-nowrap text-second">{at === null ? 'not measured' : `${durationWords(nowMs - msOfMoment(at))} ago`}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
