import type { ComponentProps } from 'react';

import { joinClasses } from '@/app/_ui/join-classes';

interface BandProps extends ComponentProps<'section'> {
  /** High and medium fill the band; everything inside then takes the band's own ink. */
  readonly priority: 'high' | 'medium' | 'low' | 'none';
}

/** A stretch of the page that carries a priority. Low is outlined at its edge, none is plain. */
export function Band({ priority, className, ...rest }: BandProps) {
  const isFilled = priority === 'high' || priority === 'medium';
  return (
    <section
      data-band={isFilled ? priority : undefined}
      className={joinClasses(priority === 'low' && 'border-l-4 border-low', className)}
      {...rest}
    />
  );
}
