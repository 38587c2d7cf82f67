'use client';

import { useRef } from 'react';

import { TodayRow } from '@/app/_features/today/today-row';
import { useArrowKeys } from '@/app/_features/today/use-arrow-keys';
import { useTodayCases } from '@/app/_features/today/use-today-cases';
import { Followed } from '@/app/_live/followed';
import { Kbd } from '@/app/_ui/kbd';
import type { CaseLine, SessionReply } from '@/lib/contracts/http/replies';
import { todayHeading, tooManyWords } from '@/lib/text/today-heading';

/** The live cases in the order of need, each followed through the one connection of this tab. */
export function TodayList({ cases, person }: { readonly cases: readonly CaseLine[]; readonly person: SessionReply }) {
  const list = useRef<HTMLUListElement>(null);
  const shown = useTodayCases(cases, person);
  const order = shown.map(({ line }) => line.caseId).join(' ');
  useArrowKeys(list, order);
  const tooMany = tooManyWords(cases.length);
  const untold = shown.filter(({ line }) => line.need === 'alert-not-told');
  return (
    <>
      {cases.map(({ caseId }) => <Followed key={caseId} caseId={caseId} />)}
      <div className="mb-3 flex flex-wrap items-end justify-between gap-x-8 gap-y-1">
        <h1 className="text-[1.7em] leading-tight font-bold">{todayHeading(shown.map(({ line }) => line))}</h1>
        {cases.length > 0 ? (
          <p className="hidden items-center gap-2 text-[0.9em] text-second sm:pointer-fine:flex">
            <Kbd>↑</Kbd><Kbd>↓</Kbd> choose <Kbd>Enter</Kbd> follow
          </p>
        ) : null}
      </div>
      {tooMany === null ? null : <p role="status" className="mb-3 border-l-4 border-ink pl-3 font-semibold">{tooMany}</p>}
      <p aria-live="assertive" className="sr-only">
        {untold.map(({ listed, line }) => `Alert not told. ${listed.title}: ${line.headline}`).join('. ')}
      </p>
      <ul ref={list} aria-label="Live cases" className="border-t border-rule">
        {shown.map((one) => <TodayRow key={one.line.caseId} {...one} />)}
      </ul>
    </>
  );
}
