'use client';

import { useEffect, useRef } from 'react';

import { Button } from '@/app/_ui/button';

interface QuestionStripProps {
  readonly question: string;
  readonly onCorrect: () => void;
  readonly onConfirm: () => void;
}

/** An unlikely value asked back. The focus stands on the harmless answer, so that a second Enter logs nothing. */
export function QuestionStrip({ question, onCorrect, onConfirm }: QuestionStripProps) {
  const harmless = useRef<HTMLButtonElement>(null);
  useEffect(() => harmless.current?.focus(), [question]);
  return (
    <div
      role="alertdialog"
      aria-label="Unlikely value"
      aria-describedby="unlikely-value"
      onKeyDown={(event) => (event.key === 'Escape' ? onCorrect() : undefined)}
      className="flex flex-wrap items-center justify-between gap-3 border-l-4 border-ink bg-raised-more py-2 pr-3 pl-4"
    >
      <p id="unlikely-value" className="max-w-prose font-semibold">{question}</p>
      <span className="flex gap-3">
        <Button ref={harmless} onClick={onCorrect}>Back to the values</Button>
        <Button onClick={onConfirm}>Log as typed</Button>
      </span>
    </div>
  );
}
