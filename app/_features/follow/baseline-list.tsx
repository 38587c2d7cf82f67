'use client';

import { useState } from 'react';

import { useFollowCase } from '@/app/_features/follow/follow-context';
import { Button } from '@/app/_ui/button';
import { acceptedBaselines, type AcceptedBaseline } from '@/lib/text/accepted-baselines';
import { actionNames } from '@/lib/text/action-names';

/** What is compared with now, each acceptance once; a provisional one waits for the physician. */
export function BaselineList() {
  const { state, timeZone } = useFollowCase();
  const baselines = acceptedBaselines(state, timeZone);
  return (
    <section aria-labelledby="baselines" className="min-w-0 py-1">
      <h2 id="baselines" className="mb-1 font-bold">Baselines</h2>
      {baselines.length === 0 ? <p className="text-second">No baseline accepted yet</p> : null}
      <ul>{baselines.map((baseline) => <Row key={baseline.seq} baseline={baseline} />)}</ul>
    </section>
  );
}

function Row({ baseline }: { readonly baseline: AcceptedBaseline }) {
  const { head, state, waiting, give } = useFollowCase();
  const [problem, setProblem] = useState<string | null>(null);
  const isGiven = waiting.some(({ command, status }) => status === 'waiting' && command.name === 'confirm-baseline' && command.baselineSeq === baseline.seq);
  const mayAccept = head.role === 'physician' && baseline.isProvisional && state.status !== 'closed';
  const accept = async () => {
    const outcome = await give({ name: 'confirm-baseline', baselineSeq: baseline.seq, text: null });
    setProblem(outcome.kind === 'refused' ? outcome.message : null);
  };
  return (
    <li className="border-b border-rule py-1.5 last:border-b-0">
      <p>
        {baseline.words}
        {baseline.isProvisional ? <strong>{', provisional'}</strong> : null}
        {isGiven ? ', your acceptance waits' : null}
      </p>
      {mayAccept && !isGiven ? <Button variant="primary" className="mt-1.5" onClick={() => void accept()} aria-label={`${actionNames.baseline}: ${baseline.words}`}>{actionNames.baseline}</Button> : null}
      {problem === null ? null : <p role="alert" className="mt-1 border-l-4 border-ink pl-2 font-semibold">{problem}</p>}
    </li>
  );
}
