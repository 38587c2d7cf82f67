'use client';

import { AdviceBlocks } from '@/app/_features/log/advice-block';
import { useLogCase } from '@/app/_features/log/log-context';
import { useWallWord } from '@/app/_features/log/use-wall-word';
import { useNow } from '@/app/_live/use-now';
import { Band } from '@/app/_ui/band';
import { Button } from '@/app/_ui/button';
import { PriorityMark } from '@/app/_ui/priority-mark';
import type { Incident } from '@/lib/case/case-state';
import { actionNames } from '@/lib/text/action-names';
import { durationWords } from '@/lib/text/format';
import { handlingWords } from '@/lib/text/handling-words';
import { incidentLine } from '@/lib/text/incident-line';
import { incidentsInOrder } from '@/lib/text/incidents-in-order';
import { sayThis } from '@/lib/text/say-this';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/** Every open notice and alert, the most needed first; the keys stand on the first. They stand above the backdrop of a question. */
export function AlertBlocks() {
  const { state } = useLogCase();
  const incidents = incidentsInOrder(state);
  return (
    <div aria-live="assertive" aria-atomic="false" className="relative z-45 shrink-0 bg-ground lg:max-h-[58%] lg:overflow-y-auto">
      {incidents.map((incident, index) => <AlertBlock key={incident.alertId} incident={incident} isFirst={index === 0} />)}
      <AdviceBlocks />
    </div>
  );
}

/** The first in full; those below it by headline, state and controls, so that all of them stand on the page. */
function AlertBlock({ incident, isFirst }: { readonly incident: Incident; readonly isFirst: boolean }) {
  const { state, timeZone, head, openDialog } = useLogCase();
  const nowMs = useNow(1000);
  const wall = useWallWord(incident, nowMs);
  const line = incidentLine(state, incident, timeZone);
  const key = (letter: string) => (isFirst ? letter : null);
  const open = (kind: 'told' | 'read-back' | 'action' | 'end') => () => openDialog({ kind, alertId: incident.alertId });
  return (
    <Band priority={line.priority ?? 'none'} aria-label={line.headline} className="border-b border-rule px-5 py-3">
      <h2 className="flex items-center gap-2.5 text-xl font-bold">
        {line.priority === null ? null : <PriorityMark kind={line.priority} className="size-5 shrink-0" />}
        {line.headline}
      </h2>
      <p className="mt-0.5 text-sm font-semibold">{`${incident.level === 'alert' ? 'Alert' : 'Notice'} for ${durationWords(nowMs - msOfMoment(incident.raisedAt))}. ${handlingWords(incident, timeZone)}${wall === null || wall.isMissing ? '' : `. ${wall.text}`}`}</p>
      {wall?.isMissing === true ? <p className="mt-1 w-fit rounded bg-ink px-2 font-bold text-ground">{wall.text}</p> : null}
      {isFirst ? (
        <>
          <p className="mt-1">{line.detail}</p>
          <SayLine words={sayThis(state, incident)} />
        </>
      ) : null}
      {head.mayWrite ? (
        <div className="mt-1.5 flex flex-wrap gap-1.5">
          <Button variant={incident.toldAt === null ? 'primary' : 'quiet'} hotkey={key('T')} onClick={open('told')}>{actionNames.told}</Button>
          <Button hotkey={key('B')} onClick={open('read-back')} disabled={incident.toldAt === null}>{actionNames.readBack}</Button>
          <Button hotkey={key('A')} onClick={open('action')}>{actionNames.acted}</Button>
          <Button hotkey={key('E')} onClick={open('end')}>{actionNames.ended}</Button>
        </div>
      ) : null}
    </Band>
  );
}

/** The sentence to say aloud, on the page's own ground so that it is read first. */
function SayLine({ words }: { readonly words: string }) {
  return (
    <p data-theme="theatre" className="my-2.5 rounded px-3 py-2">
      <span className="sr-only">Say this: </span>
      {`“${words}”`}
    </p>
  );
}
