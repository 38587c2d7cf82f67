'use client';

import { BaselineList } from '@/app/_features/follow/baseline-list';
import { ConditionList } from '@/app/_features/follow/condition-list';
import { useFollowCase } from '@/app/_features/follow/follow-context';
import { IncidentList } from '@/app/_features/follow/incident-list';
import { LeadState } from '@/app/_features/follow/lead-state';
import { NervePictures } from '@/app/_ui/nerve-pictures';
import { shownNerves } from '@/lib/chart/shown-nerves';
import { theatreView } from '@/lib/text/theatre-view';

/** What the case shows now: the state as on the wall, the nerve, the open alerts, conditions, baselines. */
export function LivePart() {
  const { state, timeZone, nowMs } = useFollowCase();
  const view = theatreView(state, nowMs, timeZone);
  return (
    <>
      <LeadState view={view} />
      <div className="border-b border-rule px-4 py-4 sm:px-6">
        <NervePictures views={shownNerves(state, view.lead.kind, nowMs)} hasAges />
      </div>
      <IncidentList />
      <div className="grid gap-x-8 border-b border-rule px-4 py-3 sm:px-6 md:grid-cols-2">
        <ConditionList />
        <BaselineList />
      </div>
    </>
  );
}
