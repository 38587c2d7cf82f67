'use client';

import Link from 'next/link';

import type { TodayCase } from '@/app/_features/today/use-today-cases';
import { feedProblemWords } from '@/app/_live/feed-words';
import { NotLiveLayer } from '@/app/_live/not-live-layer';
import { joinClasses } from '@/app/_ui/join-classes';
import { NervePictures } from '@/app/_ui/nerve-pictures';
import { StateLabel } from '@/app/_ui/state-label';
import { shownNerves } from '@/lib/chart/shown-nerves';
import type { TodayLine } from '@/lib/text/today-line';
import { theatreView } from '@/lib/text/theatre-view';

/**
 * One case. On a telephone the state and its reason come before everything else; on a wide screen the nerve stands
 * between the case and its state. The layer over it covers the row by itself whenever the case is not live.
 */
export function TodayRow({ listed, feed, state, nowMs, line, past }: TodayCase) {
  const problem = feed === undefined ? null : feedProblemWords(feed);
  const lead = state === null ? null : theatreView(state, nowMs, listed.timeZone).lead.kind;
  return (
    <li className="relative grid border-b border-rule has-focus-visible:outline-2 has-focus-visible:-outline-offset-2 has-focus-visible:outline-stain">
      <div inert={!line.isLive} aria-hidden={!line.isLive} className={rowClasses}>
        <Title title={listed.title} />
        <div className="min-w-0 self-center [grid-area:nerve]">
          {state === null || lead === null ? null : <NervePictures views={shownNerves(state, lead, nowMs)} />}
        </div>
        <State line={line} problem={problem} />
        <Facts line={line} />
      </div>
      <NotLiveLayer caseId={listed.caseId} className={joinClasses('hatched z-10', rowClasses)}>
        <Title title={listed.title} />
        <State line={past} problem={problem} />
        <Facts line={past} />
      </NotLiveLayer>
      <Link href={`/cases/${listed.caseId}/follow`} prefetch={false} data-case-link className="absolute inset-0 z-20 outline-none">
        <span className="sr-only">{`Follow ${listed.title}, ${listed.theatre}: ${line.headline}`}</span>
      </Link>
    </li>
  );
}

const rowClasses = joinClasses(
  '[grid-area:1/1] grid min-w-0 content-start gap-x-8 gap-y-1 px-1 py-3',
  "[grid-template-areas:'case'_'state'_'facts'_'nerve'] md:[grid-template-areas:'case_state'_'facts_state'_'nerve_nerve'] md:grid-cols-2 md:grid-rows-[auto_1fr]",
  "xl:[grid-template-areas:'case_nerve_state'_'facts_nerve_state'] xl:grid-cols-[minmax(0,1fr)_minmax(0,2fr)_minmax(0,1.35fr)] xl:py-4",
);

function Title({ title }: { readonly title: string }) {
  return <h2 className="min-w-0 text-[1.15em] leading-snug font-bold text-balance [grid-area:case]">{title}</h2>;
}

function State({ line, problem }: { readonly line: TodayLine; readonly problem: string | null }) {
  return (
    <div className="min-w-0 [grid-area:state]">
      <StateLabel mark={line.mark} priority={line.priority} isFlashing={line.need === 'alert-not-told' && line.isLive} className="text-[1.25em]">{line.headline}</StateLabel>
      <p className="mt-1 leading-snug text-pretty">
        {problem ?? line.why} {line.handling === null ? null : <strong>{`${line.handling}.`}</strong>}
      </p>
      {line.others.map((other) => <p key={other} className="leading-snug text-second">{other}</p>)}
      {line.tasks.map((task) => <p key={task} className="leading-snug font-semibold">{task}</p>)}
    </div>
  );
}

/** Where, how long, how old, who is there: what explains the state, quieter than it. */
function Facts({ line }: { readonly line: TodayLine }) {
  return (
    <div className="min-w-0 text-[0.95em] leading-snug text-second [grid-area:facts]">
      <p>{`${line.place}. ${line.tested}`}</p>
      <p>{line.phase}</p>
      <p>{`${line.desk}. ${line.people}`}</p>
    </div>
  );
}
