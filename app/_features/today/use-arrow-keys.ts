'use client';

import { useEffect, useLayoutEffect, useRef, type RefObject } from 'react';

const linkSelector = 'a[data-case-link]';

/**
 * Up and down go from case to case, Enter is the link's own. When the order changes the focus stays with its case: a node
 * that the page moves loses it otherwise.
 */
export function useArrowKeys(list: RefObject<HTMLElement | null>, order: string): void {
  const focused = useRef<HTMLElement | null>(null);
  useEffect(() => {
    const noteFocus = () => {
      const element = document.activeElement;
      focused.current = element instanceof HTMLElement && element.matches(linkSelector) ? element : null;
    };
    const handleKey = (event: KeyboardEvent) => {
      if (event.altKey || event.ctrlKey || event.metaKey || (event.key !== 'ArrowDown' && event.key !== 'ArrowUp')) return;
      const links = [...(list.current?.querySelectorAll<HTMLElement>(linkSelector) ?? [])];
      const at = links.findIndex((link) => link === document.activeElement);
      if (links.length === 0 || (at === -1 && document.activeElement !== document.body && document.activeElement?.id !== 'main')) return;
      event.preventDefault();
      const next = event.key === 'ArrowDown' ? at + 1 : Math.max(at - 1, 0);
      links[Math.min(next, links.length - 1)]?.focus();
    };
    window.addEventListener('keydown', handleKey);
    document.addEventListener('focusin', noteFocus);
    return () => {
      window.removeEventListener('keydown', handleKey);
      document.removeEventListener('focusin', noteFocus);
    };
  }, [list]);
  useLayoutEffect(() => {
    if (document.activeElement === document.body && focused.current?.isConnected === true) focused.current.focus();
  }, [order]);
}
