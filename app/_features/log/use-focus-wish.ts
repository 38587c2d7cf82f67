'use client';

import { useCallback, useEffect, useRef, type RefObject } from 'react';

/** Where the focus goes once the form stands as it was asked. */
export type FocusWish = 'site' | 'reading' | 'error' | { readonly field: string };

/** Puts the focus on a part of the run form now. */
export function focusOn(frame: HTMLElement | null, wish: FocusWish): void {
  frame?.querySelector<HTMLElement>(selectorOf(wish))?.focus();
}

/** Remembers a wish until the form is drawn again, then grants it once. */
export function useFocusWish(frame: RefObject<HTMLElement | null>): (wish: FocusWish) => void {
  const wished = useRef<FocusWish | null>(null);
  useEffect(() => {
    const wish = wished.current;
    wished.current = null;
    if (wish !== null) focusOn(frame.current, wish);
  });
  return useCallback((wish) => {
    wished.current = wish;
  }, []);
}

function selectorOf(wish: FocusWish): string {
  if (wish === 'site') return '[role="radiogroup"] [aria-checked="true"]';
  if (wish === 'reading') return '[data-channel] [data-numeric]';
  if (wish === 'error') return '[aria-invalid="true"]';
  return `[data-field="${wish.field}"]`;
}
