'use client';

import { useFollowCase } from '@/app/_features/follow/follow-context';
import type { Incident } from '@/lib/case/case-state';
import { alertTimes } from '@/lib/text/alert-times';
import { durationWords } from '@/lib/text/format';
import { incidentHeadline } from '@/lib/text/incident-headline';
import { incidentsInOrder } from '@/lib/text/incidents-in-order';
import { msOfMoment } from '@/lib/units/ms-of-moment';

/** Open notices and alerts with their moments, the most needed first. */
export function IncidentList() {
  const { state } = useFollowCase();
  const incidents = incidentsInOrder(state);
  if (incidents.length === 0) return null;
  return (
    <section aria-labelledby="open-alerts" className="border-b border-rule px-4 py-3 sm:px-6">
      <h2 id="open-alerts" className="mb-1 font-bold">Open alerts and notices</h2>
      {incidents.map((incident) => <Course key={incident.alertId} incident={incident} />)}
    </section>
  );
}

function Course({ incident }: { readonly incident: Incident }) {
  const { state, timeZone, nowMs } = useFollowCase();
  const name = incident.level === 'alert' ? 'Alert' : 'Notice';
  return (
    <article className="py-1.5">
      <h3 className="font-semibold">{`${name}: ${incidentHeadline(state, incident)}, for ${durationWords(nowMs - msOfMoment(incident.raisedAt))}`}</h3>
      {incident.action === null ? null : <p className="text-second">{`Surgeon’s action: ${incident.action}`}</p>}
      <dl className="mt-1 grid grid-cols-[repeat(auto-fill,minmax(7.2em,1fr))] gap-x-4 gap-y-1">
        {alertTimes(state, incident, timeZone).map((moment) => (
          <div key={moment.name}>
            <dt className="text-[0.9em] text-second">{moment.name}</dt>
            <dd className={moment.time === null ? 'text-second' : 'font-mono'}>{moment.time ?? 'not yet'}</dd>
          </div>
        ))}
      </dl>
    </article>
  );
}
