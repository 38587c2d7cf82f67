/** Marks where the focus goes when what had it before a question is gone. */
export const focusHome = { 'data-focus-home': 'yes' } as const;

/** Puts the focus back where it was before a question; where that is gone, to the page's own home of the focus. */
export function returnFocus(before: Element | null): void {
  if (isReachable(before)) before.focus();
  if (before !== null && document.activeElement === before) return;
  const home = document.querySelector<HTMLElement>('[data-focus-home]') ?? document.getElementById('main');
  home?.focus();
}

function isReachable(element: Element | null): element is HTMLElement {
  return element instanceof HTMLElement && element !== document.body && element.isConnected && !element.matches(':disabled');
}
