'use client';

import type { ComponentProps } from 'react';

import { OpenAlerts } from '@/app/_features/log/open-alerts';
import { Dialog } from '@/app/_ui/dialog';

/** Beside the column of the alerts where the page has one: its widths are those of the console's grid. */
const besideAlerts =
  'left-1/2 w-[calc(100vw-2rem)] lg:left-[calc((100vw-21rem)/2)] lg:w-[calc(100vw-23rem)] xl:left-[calc((100vw-23rem)/2)] xl:w-[calc(100vw-25rem)]';

/** A question of the console. It never covers or dims an open alert; in a narrow window it carries the alerts itself. */
export function ConsoleDialog({ children, ...dialog }: Omit<ComponentProps<typeof Dialog>, 'placeClasses'>) {
  return (
    <Dialog {...dialog} placeClasses={besideAlerts}>
      <OpenAlerts className="mb-4 lg:hidden" />
      {children}
    </Dialog>
  );
}
