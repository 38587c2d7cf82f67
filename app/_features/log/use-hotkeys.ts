'use client';

import { useEffect, useRef } from 'react';

/** Keys of one letter, or "?", each with what it does. */
export type Hotkeys = Readonly<Record<string, () => void>>;

/** A person is writing there: letters belong to the text. Numeric fields take no letters, so theirs are free. */
function isTextField(element: Element | null): boolean {
  if (!(element instanceof HTMLElement)) return false;
  if (element.dataset['numeric'] === 'yes') return false;
  if (element instanceof HTMLInputElement) return !['radio', 'checkbox', 'button', 'submit'].includes(element.type);
  return element instanceof HTMLTextAreaElement || element instanceof HTMLSelectElement || element.isContentEditable;
}

/**
 * Letters as keys of the console. They do nothing while a dialog is open, in a text field, with a modifier, on repeat,
 * or while a number is half typed; then `onHalfTyped` is told which key was not taken.
 */
export function useHotkeys(keys: Hotkeys, isEnabled: boolean, onHalfTyped?: (key: string) => void): void {
  const held = useRef({ keys, onHalfTyped });
  useEffect(() => {
    held.current = { keys, onHalfTyped };
  });
  useEffect(() => {
    if (!isEnabled) return;
    const handleKey = (event: KeyboardEvent) => {
      if (event.ctrlKey || event.metaKey || event.altKey || event.repeat || event.defaultPrevented && !isNumeric(event.target)) return;
      const key = event.key.toLowerCase();
      const act = Object.hasOwn(held.current.keys, key) ? held.current.keys[key] : undefined;
      if (act === undefined || /^\d$/.test(key)) return;
      const focused = document.activeElement;
      if (isTextField(focused)) return;
      event.preventDefault();
      if (focused instanceof HTMLElement && focused.dataset['halfTyped'] === 'yes') held.current.onHalfTyped?.(key);
      else act();
    };
    window.addEventListener('keydown', handleKey);
    return () => window.removeEventListener('keydown', handleKey);
  }, [isEnabled]);
}

function isNumeric(target: EventTarget | null): boolean {
  return target instanceof HTMLElement && target.dataset['numeric'] === 'yes';
}
