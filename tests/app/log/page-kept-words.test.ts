import { describe, expect, it } from 'vitest';

import { pageKeptWords } from '@/app/_features/log/page-kept-words';

const kept = { isPageKept: true, isStorageDurable: true, isSecure: true, canKeepPages: true };

describe('pageKeptWords', () => {
  it('says that the page comes back without a link, and has nothing to explain', () => {
    expect(pageKeptWords(kept)).toEqual({ isKept: true, short: 'Reloads without link', sentence: null });
  });

  it('claims nothing before the browser has answered', () => {
    expect(pageKeptWords({ ...kept, isPageKept: null })).toEqual({ isKept: false, short: 'Keeping the page', sentence: null });
  });

  it.each([
    ['a file that could not be stored', { isPageKept: false }, /a part of it could not be stored/],
    ['a browser that stores nothing, even with the page kept', { isStorageDurable: false }, /this browser stores nothing/],
    ['an address without https', { isPageKept: false, isSecure: false, canKeepPages: false }, /neither https nor this computer/],
    ['a browser without a store of pages', { isPageKept: false, canKeepPages: false }, /this browser cannot keep pages/],
  ])('says why not: %s', (_what, change, why) => {
    const words = pageKeptWords({ ...kept, ...change });
    expect(words).toMatchObject({ isKept: false, short: 'No reload without link' });
    expect(words.sentence).toMatch(/^Without a link this page would not load again: /);
    expect(words.sentence).toMatch(why);
  });
});
