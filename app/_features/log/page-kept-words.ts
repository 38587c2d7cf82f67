/** What is known of a reload without a link. */
export interface PageKeeping {
  /** Whether the page loads without a link; null before the browser answered. */
  readonly isPageKept: boolean | null;
  /** Whether this browser stores anything: the head of the case, its log and waiting entries. */
  readonly isStorageDurable: boolean;
  /** Whether the address is one to which the browser gives its store of pages: https, or this computer itself. */
  readonly isSecure: boolean;
  /** Whether the browser can keep pages at all. */
  readonly canKeepPages: boolean;
}

/** Whether this page would come back after a reload without a link: few words for the head, a sentence when it would not. */
export interface PageKeptWords {
  readonly isKept: boolean;
  readonly short: string;
  /** Why not, and what helps; null when it is kept or not known yet. */
  readonly sentence: string | null;
}

/** Says in words whether the page survives a reload without a link. */
export function pageKeptWords({ isPageKept, isStorageDurable, isSecure, canKeepPages }: PageKeeping): PageKeptWords {
  if (!canKeepPages) return lost(isSecure ? 'this browser cannot keep pages. Use another browser' : 'the address is neither https nor this computer, so the browser keeps no page of it. Open it by https');
  if (!isStorageDurable) return lost('this browser stores nothing for this address. Leave private browsing, or allow storage');
  if (isPageKept === null) return { isKept: false, short: 'Keeping the page', sentence: null };
  if (!isPageKept) return lost('a part of it could not be stored in this browser. Load it again while there is a link');
  return { isKept: true, short: 'Reloads without link', sentence: null };
}

function lost(why: string): PageKeptWords {
  return { isKept: false, short: 'No reload without link', sentence: `Without a link this page would not load again: ${why}` };
}
