import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

import { emptyFeed, emptyLiveStore, useLiveStore } from '@/app/_live/live-store';
import { NotLiveLayer } from '@/app/_live/not-live-layer';

const caseId = 'case-1';
const startMs = Date.parse('2027-03-14T11:00:00.000Z');
let made: FakeAnimation[] = [];

/** What jsdom lacks: an animation with the states of the Web Animations specification as far as the layer uses them. */
class FakeAnimation {
  currentTime = 0;
  playState: 'running' | 'finished' | 'idle' = 'running';
  constructor(
    readonly keyframes: Keyframe[],
    readonly options: KeyframeAnimationOptions,
  ) {}
  play() {
    if (this.currentTime >= Number(this.options.duration)) this.currentTime = 0;
    this.playState = 'running';
  }
  finish() {
    this.currentTime = Number(this.options.duration);
    this.playState = 'finished';
  }
  cancel() {
    this.playState = 'idle';
  }
}

const check = (checkedAtMs: number | null) =>
  useLiveStore.setState({ feeds: { [caseId]: { ...emptyFeed, checkedAt: checkedAtMs === null ? null : new Date(checkedAtMs).toISOString() } } });

beforeEach(() => {
  vi.useFakeTimers({ now: startMs });
  made = [];
  useLiveStore.setState(emptyLiveStore, true);
  Element.prototype.animate = function animate(keyframes, options) {
    const animation = new FakeAnimation(keyframes as Keyframe[], options as KeyframeAnimationOptions);
    made.push(animation);
    return animation as unknown as Animation;
  };
});

afterEach(() => {
  cleanup();
  vi.useRealTimers();
});

function renderLayer(): FakeAnimation {
  render(<NotLiveLayer caseId={caseId}>Not live</NotLiveLayer>);
  return made[0]!;
}

describe('NotLiveLayer', () => {
  it('covers at first: in the page, opaque, its animation at the end', () => {
    const animation = renderLayer();
    const layer = screen.getByText('Not live');
    expect(layer.style.opacity).toBe('1');
    expect(layer.dataset.live).toBe('no');
    expect(animation).toMatchObject({ currentTime: 3000, playState: 'finished' });
  });

  it('holds nothing visible until 99.5 % of 3 s and animates opacity only', () => {
    const { keyframes, options } = renderLayer();
    expect(options).toMatchObject({ duration: 3000, fill: 'both' });
    expect(options.delay).toBeUndefined();
    expect(keyframes).toEqual([
      { opacity: 0, offset: 0 },
      { opacity: 0, offset: 0.995 },
      { opacity: 1, offset: 1 },
    ]);
  });

  it('starts again at the age of each check, and not for anything else', () => {
    const animation = renderLayer();
    check(startMs - 400);
    expect(animation).toMatchObject({ currentTime: 400, playState: 'running' });
    animation.currentTime = 1500;
    check(startMs - 400);
    useLiveStore.setState({ waiting: [] });
    expect(animation.currentTime).toBe(1500);
    check(startMs);
    expect(animation.currentTime).toBe(0);
  });

  it.each([
    ['a check that is 3 s old', startMs - 3000],
    ['a feed that was never checked', null],
  ])('covers for %s', (_, checkedAtMs) => {
    const animation = renderLayer();
    check(startMs);
    check(checkedAtMs);
    expect(animation).toMatchObject({ currentTime: 3000, playState: 'finished' });
  });

  it.each([{ problem: 'fork' as const }, { problem: 'newer-version' as const }, { ended: 'revoked' as const }])('covers at once for %o, whatever the check', (change) => {
    const animation = renderLayer();
    check(startMs);
    useLiveStore.setState(({ feeds }) => ({ feeds: { [caseId]: { ...feeds[caseId]!, ...change } } }));
    expect(animation).toMatchObject({ currentTime: 3000, playState: 'finished' });
  });

  it('reckons the age on the server\'s clock', () => {
    useLiveStore.setState({ link: { ...emptyLiveStore.link, offsetMs: 60_000 } });
    const animation = renderLayer();
    check(startMs + 60_000 - 250);
    expect(animation.currentTime).toBe(250);
  });

  it('ends its animation with the page', () => {
    const animation = renderLayer();
    cleanup();
    check(startMs);
    expect(animation.playState).toBe('idle');
  });
});
