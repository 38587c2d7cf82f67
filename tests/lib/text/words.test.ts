import { readdirSync, readFileSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { notComparedWords, noVelocityWords } from '@/lib/text/reason-words';
import { insideSentence, nerveTitle } from '@/lib/text/nerve-title';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { siteName, siteNames } from '@/lib/text/site-name';

/** Everything that a person reads on the wall stands in these files as text. */
const sources = readdirSync('lib/text').map((name) => [name, readFileSync(`lib/text/${name}`, 'utf8')] as const);

describe('the words of lib/text', () => {
  it.each([...Object.entries(notComparedWords), ...Object.entries(noVelocityWords)])('%s has words', (_reason, words) => {
    expect(words).toMatch(/^[a-z][a-z -]+[a-z]$/);
    expect(words.length).toBeLessThanOrEqual(40);
  });

  it.each(sources)('%s calls nothing normal and tells a surgeon nothing to do', (_name, text) => {
    const strings = [...text.matchAll(/'([^'\n]*)'|`([^`]*)`/g)].map((match) => match[1] ?? match[2] ?? '');
    const wrong = strings.filter((one) => /\b(normal|abnormal|please|stop|release|must|should|safe|ok|fine)\b|!$/i.test(one) && !/^@?\//.test(one) && one.includes(' '));
    expect(wrong).toEqual([]);
  });
});

describe('names in sentences', () => {
  it.each([
    ['Ulnar', 'ulnar'],
    ['C5 root', 'C5 root'],
    ['Common fibular', 'common fibular'],
    ['AIN', 'AIN'],
  ])('insideSentence writes %s as %s', (name, expected) => expect(insideSentence(name)).toBe(expected));

  it('nerveTitle calls the only control Control, every other nerve by its name', () => {
    expect(nerveTitle(ulnarAtElbow, 'median')).toBe('Control');
    expect(nerveTitle(ulnarAtElbow, 'ulnar')).toBe('Ulnar');
    expect(nerveTitle(ulnarAtElbow, 'gone')).toBe('gone');
    const two = { ...ulnarAtElbow, nerves: [...ulnarAtElbow.nerves, { ...ulnarAtElbow.nerves[1]!, id: 'radial', name: 'Radial, control' }] };
    expect(nerveTitle(two, 'radial')).toBe('Radial, control');
  });

  it('siteNames says a last word that both share once', () => {
    expect(siteNames(ulnarAtElbow, 'above-elbow', 'below-elbow')).toBe('above and below elbow');
    expect(siteNames(ulnarAtElbow, 'axilla', 'above-elbow')).toBe('axilla and above elbow');
    expect(siteName(ulnarAtElbow, 'gone')).toBe('gone');
  });
});
