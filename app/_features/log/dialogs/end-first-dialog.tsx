'use client';

import { ConsoleDialog } from '@/app/_features/log/console-dialog';
import { useLogCase } from '@/app/_features/log/log-context';
import { Button } from '@/app/_ui/button';
import { PriorityMark } from '@/app/_ui/priority-mark';
import { actionNames } from '@/lib/text/action-names';
import { incidentLine } from '@/lib/text/incident-line';
import { incidentsInOrder } from '@/lib/text/incidents-in-order';

/** What stands in the way of closing: each open alert in words, with the way to end it. Nothing is closed from here. */
export function EndFirstDialog({ onClose }: { readonly onClose: () => void }) {
  const { state, timeZone, openDialog } = useLogCase();
  const alerts = incidentsInOrder(state).filter((incident) => incident.level === 'alert');
  const lines = alerts.map((incident) => ({ incident, line: incidentLine(state, incident, timeZone) }));
  const count = alerts.length === 1 ? 'An alert is open' : `${alerts.length} alerts are open`;
  return (
    <ConsoleDialog
      isOpen
      onOpenChange={(isOpen) => (isOpen ? undefined : onClose())}
      title={`${actionNames.closeCase}: ${count.charAt(0).toLowerCase()}${count.slice(1)}`}
      description="A case is closed when each alert has ended, with its outcome and its cause. The case stays open and monitored until then."
    >
      <ul className="flex flex-col border-t border-rule">
        {lines.map(({ incident, line }, index) => (
          <li key={incident.alertId} className="flex items-center justify-between gap-5 border-b border-rule py-3">
            <div>
              <p className="flex items-center gap-2 font-semibold">
                {line.priority === null ? null : <PriorityMark kind={line.priority} className="size-4 shrink-0" />}
                {line.headline}
              </p>
              <p className="text-second">{line.detail}</p>
            </div>
            <Button
              variant={index === 0 ? 'primary' : 'quiet'}
              autoFocus={index === 0}
              aria-label={`${actionNames.ended}: ${line.headline}`}
              onClick={() => openDialog({ kind: 'end', alertId: incident.alertId })}
            >
              {actionNames.ended}
            </Button>
          </li>
        ))}
      </ul>
      <Button hotkey="Esc" className="mt-4" onClick={onClose}>Leave</Button>
    </ConsoleDialog>
  );
}
