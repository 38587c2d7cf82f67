import { cleanup, render, screen } from '@testing-library/react';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';

import { TheatrePicture } from '@/app/_features/theatre/theatre-picture';
import { usualWallSettings } from '@/app/_features/theatre/wall-settings';
import type { TheatreView } from '@/lib/text/theatre-line';
import { wallStates } from '@/tests/support/theatre-gallery/wall-states';

const shown = wallStates['told']!();
const deskWords = 'Desk not connected since 10:41';

/** Height of the wall, and what stands on it besides: the imitated browser lays nothing out itself. */
let wallPx = 768;
const sizeOf = (wall: HTMLElement, name: string) => Number.parseFloat(wall.style.getPropertyValue(name));

/** Two lines of headline, five of words, one row for three facts, one for the ages, one for the missing desk. */
function contentPx(wall: HTMLElement): number {
  const facts = wall.querySelectorAll('footer li').length;
  const rows = 5 + (facts === 0 ? 0 : 1.1 + Math.ceil(facts / 3) * 1.2) + (wall.innerHTML.includes(' ago<') ? 1.2 : 0);
  return 2 * sizeOf(wall, '--headline') + sizeOf(wall, '--needed') * rows + deskPx(wall);
}
const deskPx = (element: Element) => (/Desk.not.connected/.test(element.textContent ?? '') ? 2.26 * sizeOf(element.closest('.wall')!, '--needed') : 0);

const layout = {
  scrollHeight: function (this: HTMLElement) { return Math.max(wallPx, contentPx(this)); },
  clientHeight: () => wallPx,
  offsetHeight: function (this: HTMLElement) { return deskPx(this); },
} as const;

beforeAll(() => {
  Object.defineProperty(document, 'fonts', { configurable: true, value: new EventTarget() });
  for (const [name, get] of Object.entries(layout)) Object.defineProperty(HTMLElement.prototype, name, { configurable: true, get });
});
afterAll(() => Object.keys(layout).forEach((name) => Reflect.deleteProperty(HTMLElement.prototype, name)));
afterEach(cleanup);

async function picture(view: TheatreView, words: string | null) {
  const { container } = render(<TheatrePicture {...shown} view={view} isLive deskWords={words} settings={usualWallSettings} />);
  await new Promise((resolve) => setTimeout(resolve, 0));
  const wall = container.querySelector<HTMLElement>('.wall')!;
  const seen = { headlinePx: sizeOf(wall, '--headline'), neededPx: sizeOf(wall, '--needed'), isCut: contentPx(wall) > wallPx + 1, facts: wall.querySelectorAll('footer li').length };
  cleanup();
  return seen;
}

describe('TheatrePicture', () => {
  it('keeps the size of an open alert when the desk is missing, on every wall that has room for a fact', async () => {
    const sizes = new Set<number>();
    const factCounts = new Set<number>();
    for (wallPx = 160; wallPx <= 480; wallPx += 12) {
      const before = await picture(shown.view, null);
      if (before.facts === 0) continue;
      const after = await picture(shown.view, deskWords);
      expect({ wallPx, ...after }).toMatchObject({ wallPx, headlinePx: before.headlinePx, neededPx: before.neededPx, isCut: before.isCut });
      sizes.add(after.headlinePx);
      factCounts.add(after.facts);
    }
    // The heights reach several sizes and facts that gave way; else the agreement above would say little.
    expect(sizes.size).toBeGreaterThan(3);
    expect(factCounts.size).toBeGreaterThan(1);
    wallPx = 768;
  }, 60_000);

  it('says that the desk is missing, since when, and nothing while it is there', () => {
    render(<TheatrePicture {...shown} isLive deskWords={deskWords} settings={usualWallSettings} />);
    expect(screen.getByText(deskWords)).toBeDefined();
    cleanup();
    render(<TheatrePicture {...shown} isLive deskWords={null} settings={usualWallSettings} />);
    expect(screen.queryByText(/Desk not connected/)).toBeNull();
  });
});
