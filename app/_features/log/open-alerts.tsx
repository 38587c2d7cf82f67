'use client';

import { useLogCase } from '@/app/_features/log/log-context';
import { Band } from '@/app/_ui/band';
import { joinClasses } from '@/app/_ui/join-classes';
import { PriorityMark } from '@/app/_ui/priority-mark';
import { incidentLine } from '@/lib/text/incident-line';
import { incidentsInOrder } from '@/lib/text/incidents-in-order';

/** Every open notice and alert in one line each, with its mark. */
export function OpenAlerts({ className }: { readonly className?: string }) {
  const { state, timeZone } = useLogCase();
  const incidents = incidentsInOrder(state);
  if (incidents.length === 0) return null;
  return (
    <div className={joinClasses('flex flex-col gap-1', className)}>
      {incidents.map((incident) => {
        const { headline, priority } = incidentLine(state, incident, timeZone);
        return (
          <Band key={incident.alertId} priority={priority ?? 'none'} aria-label={headline} className="flex items-center gap-2 px-3 py-1.5 font-semibold">
            {priority === null ? null : <PriorityMark kind={priority} className="size-4 shrink-0" />}
            <p>{`${incident.level === 'alert' ? 'Alert' : 'Notice'}: ${headline}`}</p>
          </Band>
        );
      })}
    </div>
  );
}
