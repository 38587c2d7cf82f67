import { cleanup, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';

import { adm, monitoredUlnar } from '@/tests/support/ulnar-case';

import { renderConsole } from './render-console';

afterEach(() => {
  cleanup();
  vi.restoreAllMocks();
});

/** A response lost to 40 %, once: a notice; twice: an alert. */
function fallenUlnar(times: 1 | 2) {
  const script = monitoredUlnar();
  for (let count = 0; count < times; count += 1) script.wait(5000).run('above-elbow', { adm: adm('above-elbow', 0.4) });
  return script;
}

/** The submit of a field's Enter; long after the question opened unless told otherwise. */
function submit(dialog: HTMLElement, afterMs = 5000) {
  const openedMs = performance.now();
  vi.spyOn(performance, 'now').mockReturnValue(openedMs + afterMs);
  fireEvent.submit(dialog.querySelector('form')!);
}

function open(script: ReturnType<typeof monitoredUlnar>, name: string, dialog: Parameters<typeof renderConsole>[1][string]) {
  const { given } = renderConsole(script, { [name]: dialog });
  const opener = screen.getByRole('button', { name });
  opener.focus();
  fireEvent.click(opener);
  return { given, opener, dialog: screen.getByRole('dialog') };
}

describe('closing a case', () => {
  it('names every open alert in words, offers to end it, and closes nothing', () => {
    const { dialog, given } = open(fallenUlnar(2), 'Close', { kind: 'close' });
    expect(dialog.textContent).toContain('Close case: an alert is open');
    expect(dialog.textContent).toContain('Ulnar at 40\u00a0% of baseline');
    expect(within(dialog).queryByRole('button', { name: /^Close case/ })).toBeNull();
    const end = within(dialog).getByRole('button', { name: 'End: Ulnar at 40\u00a0% of baseline' });
    expect(document.activeElement).toBe(end);
    fireEvent.click(end);
    expect(screen.getByRole('dialog').textContent).toContain('End: how it came out');
    expect(given).toEqual([]);
  });

  it('asks for a tick while a notice is open', async () => {
    const { dialog, given } = open(fallenUlnar(1), 'Close', { kind: 'close' });
    submit(dialog);
    expect(within(dialog).getByRole('alert').textContent).toBe('Notice open: Ulnar at 40\u00a0% of baseline. Tick that the case is closed all the same, or leave');
    expect(given).toEqual([]);
    fireEvent.click(within(dialog).getByRole('checkbox', { name: /Ulnar at 40/ }));
    submit(dialog, 10_000);
    await waitFor(() => expect(given).toEqual([{ name: 'close-case', text: null }]));
  });

  it('closes with one press when nothing is open', async () => {
    const { dialog, given } = open(monitoredUlnar(), 'Close', { kind: 'close' });
    submit(dialog);
    await waitFor(() => expect(given).toEqual([{ name: 'close-case', text: null }]));
  });

  it('does not hear the echo of the press that opened it', () => {
    const { dialog, given } = open(monitoredUlnar(), 'Close', { kind: 'close' });
    submit(dialog, 100);
    expect(given).toEqual([]);
  });
});

describe('a correction', () => {
  it('has a heading over each column of numbers', () => {
    const script = monitoredUlnar();
    const { dialog } = open(script, 'Correct', { kind: 'correct', runSeq: script.state.runs.at(-1)!.seq });
    for (const heading of ['Onset, ms', 'Amplitude, mV', 'Neg. peak, ms', 'Trace']) expect(within(dialog).getByText(heading)).toBeTruthy();
  });
});

describe('the focus after a question', () => {
  it('goes back to where it was', async () => {
    const { opener } = open(monitoredUlnar(), 'Keys', { kind: 'keys' });
    fireEvent.keyDown(screen.getByRole('dialog'), { key: 'Escape' });
    await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull());
    await waitFor(() => expect(document.activeElement).toBe(opener));
  });

  it('goes to the chosen site when what had it is gone', async () => {
    const { opener } = open(monitoredUlnar(), 'Keys', { kind: 'keys' });
    opener.remove();
    fireEvent.keyDown(screen.getByRole('dialog'), { key: 'Escape' });
    await waitFor(() => expect(document.activeElement).toBe(screen.getByRole('radio', { checked: true })));
  });
});

describe('an open alert', () => {
  it.each(['told', 'read-back', 'action', 'end'] as const)('is named in the question that speaks of it: %s', (kind) => {
    const script = fallenUlnar(2);
    const { alertId } = Object.values(script.state.incidents)[0]!;
    open(script, 'Ask', { kind, alertId });
    expect(screen.getByRole('dialog', { description: /Alert: Ulnar at 40\s% of baseline/ })).toBeTruthy();
  });

  it('stands in the question too, where the window has no column for it', () => {
    const { dialog } = open(fallenUlnar(2), 'Keys', { kind: 'keys' });
    expect(dialog.textContent).toContain('Alert: Ulnar at 40\u00a0% of baseline');
  });
});
