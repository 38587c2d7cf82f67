'use client';

import { useState } from 'react';

import { useLogCase } from '@/app/_features/log/log-context';
import { useNow } from '@/app/_live/use-now';
import { Button } from '@/app/_ui/button';
import type { KeptAdvice } from '@/lib/case/case-state';
import { actionNames } from '@/lib/text/action-names';
import { durationWords } from '@/lib/text/format';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/** Advice that waits for the desk, the oldest first; the key stands on the first. Not in a priority colour: those are for the nerve. */
export function AdviceBlocks() {
  const { state } = useLogCase();
  const waiting = state.advice.filter((advice) => advice.confirmedAt === null);
  return waiting.map((advice, index) => <AdviceBlock key={advice.seq} advice={advice} isFirst={index === 0} />);
}

function AdviceBlock({ advice, isFirst }: { readonly advice: KeptAdvice; readonly isFirst: boolean }) {
  const { head, give } = useLogCase();
  const nowMs = useNow(1000);
  const [problem, setProblem] = useState<string | null>(null);
  const confirm = async () => {
    const outcome = await give({ name: 'confirm-advice', adviceSeq: advice.seq, text: null });
    setProblem(outcome.kind === 'refused' ? outcome.message : null);
  };
  return (
    <section aria-label={`${actionNames.advice} of the ${advice.byRole}`} className="border-b border-rule border-l-4 border-l-stain bg-raised-more px-4 py-3">
      <h2 className="font-bold">{`${actionNames.advice} of the ${advice.byRole}, ${durationWords(nowMs - msOfMoment(advice.at))} ago`}</h2>
      <p className="mt-0.5">{advice.text}</p>
      {head.mayWrite ? <Button variant="primary" hotkey={isFirst ? 'V' : null} className="mt-1.5" onClick={() => void confirm()}>{actionNames.adviceConfirmed}</Button> : null}
      {problem === null ? null : <p role="alert" className="mt-1 border-l-4 border-ink pl-2 font-semibold">{problem}</p>}
    </section>
  );
}
