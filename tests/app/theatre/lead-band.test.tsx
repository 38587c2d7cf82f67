import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';

import { LeadBand } from '@/app/_features/theatre/lead-band';
import type { TheatreKind, TheatreLine } from '@/lib/text/theatre-line';

afterEach(cleanup);

const line: TheatreLine = { kind: 'alert', priority: 'high', isCalm: false, isFlashing: true, nerveId: 'ulnar', headline: 'Ulnar at 36\u00a0% of baseline', detail: 'Last good 10:38.' };

/** What tells states apart without colour: filling, flash, shape. */
function looks(shown: TheatreLine) {
  const { container } = render(<LeadBand line={shown} />);
  const shapes = [...container.querySelectorAll('svg')].map((mark) => mark.innerHTML);
  return { band: container.querySelector('[data-band]')?.getAttribute('data-band') ?? null, isFlashing: container.querySelector('.flashes') !== null, shape: shapes[0] ?? '', isCalmGround: container.querySelector('.bg-raised') !== null };
}

describe('LeadBand', () => {
  it('fills the band and flashes for an alert that nobody was told', () => expect(looks(line)).toMatchObject({ band: 'high', isFlashing: true }));
  it('stops the flash at told and keeps the rest', () => expect(looks({ ...line, isFlashing: false })).toMatchObject({ band: 'high', isFlashing: false }));
  it('fills for a notice and never flashes', () => expect(looks({ ...line, kind: 'notice', priority: 'medium' })).toMatchObject({ band: 'medium', isFlashing: false }));

  it('gives each priority and the calm state a shape of its own', () => {
    const shapes = (['high', 'medium', 'low'] as const).map((priority) => looks({ ...line, priority, isFlashing: false }).shape);
    const calm = looks({ ...line, kind: 'stable', priority: null, isCalm: true, isFlashing: false }).shape;
    expect(new Set([...shapes, calm]).size).toBe(4);
  });

  it.each<TheatreKind>(['set-up', 'no-baseline', 'not-tested', 'tourniquet-up', 'paused', 'take-down', 'closed', 'withdrawn', 'recovered', 'cannot-be-judged'])('shows %s neither with the calm shape nor on the calm ground', (kind) => {
    const calm = looks({ ...line, kind: 'stable', priority: null, isCalm: true, isFlashing: false });
    const shown = looks({ ...line, kind, priority: null, isCalm: false, isFlashing: false });
    expect(calm.isCalmGround).toBe(true);
    expect(shown.isCalmGround).toBe(false);
    expect(shown.shape).not.toBe(calm.shape);
  });

  it('never ends a line inside a fact', () => {
    render(<LeadBand line={{ ...line, detail: 'Between above and below elbow. Last good 11:22, first seen 11:24.' }} />);
    const words = screen.getByText(/^Between/).textContent ?? '';
    expect(words).toContain('Last\u00a0good\u00a011:22');
    expect(words).toContain('first\u00a0seen\u00a011:24');
  });

  it('says the words', () => {
    render(<LeadBand line={line} />);
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe('Ulnar at\u00a036\u00a0% of baseline');
    expect(screen.getByText('Last good 10:38.')).toBeDefined();
  });
});
