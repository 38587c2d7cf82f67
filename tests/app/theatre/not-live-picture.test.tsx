import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';

import { NotLivePicture } from '@/app/_features/theatre/not-live-picture';
import { usualWallSettings } from '@/app/_features/theatre/wall-settings';
import type { TheatreLine } from '@/lib/text/theatre-line';

const alert: TheatreLine = { kind: 'alert', priority: 'high', isCalm: false, isFlashing: true, nerveId: 'ulnar', headline: 'Ulnar at 36\u00a0% of baseline', detail: '' };
const stable: TheatreLine = { ...alert, kind: 'stable', priority: null, isCalm: true, isFlashing: false, headline: 'Stable' };

function show(lines: readonly TheatreLine[], lastLive: string | null = '10:44:07') {
  return render(<NotLivePicture place="Theatre 3, left" procedure="Ulnar" reason="No word from the log." lastLive={lastLive} lines={lines} settings={usualWallSettings} />).container;
}

beforeEach(() => {
  // The imitated browser has no font loading of its own.
  Object.defineProperty(document, 'fonts', { configurable: true, value: new EventTarget() });
});
afterEach(cleanup);

describe('NotLivePicture', () => {
  it('says that it is not live, why, and from when the state is', () => {
    show([stable]);
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe('Not live');
    expect(screen.getByText('No word from the log.')).toBeDefined();
    expect(screen.getByText('State at 10:44:07. It may have changed.')).toBeDefined();
  });
  it('keeps the mark and the size of an alert that was open, in the past tense, without a flash', () => {
    const container = show([alert]);
    const row = screen.getByText('Alert was open: ulnar at 36 % of baseline').closest('li');
    expect(row?.className).toContain('--headline');
    expect(row?.querySelector('svg')).not.toBeNull();
    expect(container.querySelector('.flashes')).toBeNull();
  });
  it('does not let a calm state look calm', () => {
    const container = show([stable]);
    const row = screen.getByText('Shown then: stable').closest('li');
    expect(row?.className).not.toContain('--headline');
    expect(container.querySelector('svg')).toBeNull();
  });
  it('carries no clock that could stand still', () => {
    expect(show([alert]).querySelector('time')).toBeNull();
  });
  it('says so when nothing was ever shown', () => {
    show([], null);
    expect(screen.getByText('Nothing was shown yet')).toBeDefined();
  });
});
