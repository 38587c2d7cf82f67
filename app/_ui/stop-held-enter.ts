import type { KeyboardEvent } from 'react';

/** A held key is one press: the repeats of Enter that the keyboard sends press nothing. */
export function stopHeldEnter(event: KeyboardEvent): void {
  if (event.key === 'Enter' && event.repeat) event.preventDefault();
}
