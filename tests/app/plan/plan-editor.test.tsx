import { cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

import { PlanEditor } from '@/app/_features/plan/plan-editor';
import type { PlanPlace } from '@/app/_features/plan/plan-places';
import { planPlaces } from '@/app/_features/plan/plan-places';

const { planCase } = vi.hoisted(() => ({ planCase: vi.fn() }));
vi.mock('next/navigation', () => ({ useRouter: () => ({ push: () => undefined }) }));
vi.mock('@/app/_live/api', () => ({ planCase }));

const larkmoor: PlanPlace = { hospitalId: 'hospital-1', hospitalName: 'Larkmoor General', theatreNames: ['Theatre 1', 'Theatre 2'] };
const quillhaven: PlanPlace = { hospitalId: 'hospital-2', hospitalName: 'Quillhaven Infirmary', theatreNames: ['Theatre 1', 'Day theatre'] };

/** The whole plan page in an imitated browser is slow on a busy machine. */
vi.setConfig({ testTimeout: 60_000 });
const patience = { timeout: 20_000 };

beforeEach(() => {
  planCase.mockReset().mockResolvedValue({ kind: 'refused', code: 'x', message: 'Not planned here', field: null });
  vi.stubGlobal('ResizeObserver', class { observe() {} unobserve() {} disconnect() {} });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

/** The sentence that a field is described by; null while it has none. */
function sentenceAt(field: HTMLElement): string | null {
  const id = (field.getAttribute('aria-describedby') ?? '').split(' ').find((part) => part.endsWith('-error'));
  return id === undefined ? null : (document.getElementById(id)?.textContent ?? null);
}

function fillPatient() {
  fireEvent.change(screen.getByLabelText('Patient label'), { target: { value: 'Invented patient' } });
  fireEvent.change(screen.getByLabelText('Record number'), { target: { value: 'DEMO-1' } });
}

async function planned(): Promise<{ hospitalId?: string; plan: { theatre: string } }> {
  fireEvent.click(screen.getByRole('button', { name: 'Plan case' }));
  await waitFor(() => expect(planCase).toHaveBeenCalledTimes(1), patience);
  return planCase.mock.calls[0]?.[0] as Awaited<ReturnType<typeof planned>>;
}

describe('the hospital of a plan', () => {
  it('is not asked of a person of one hospital, and not sent', async () => {
    render(<PlanEditor places={[larkmoor]} />);
    expect(screen.queryByLabelText('Hospital')).toBeNull();
    fillPatient();
    expect(await planned()).not.toHaveProperty('hospitalId');
  });

  it('is chosen by a person of two hospitals, and its theatres are offered', async () => {
    render(<PlanEditor places={[larkmoor, quillhaven]} />);
    fireEvent.change(screen.getByLabelText('Theatre'), { target: { value: 'Theatre 2' } });
    fireEvent.change(screen.getByLabelText('Hospital'), { target: { value: 'hospital-2' } });
    const theatres = [...screen.getByLabelText<HTMLSelectElement>('Theatre').options].map((option) => option.value);
    expect(theatres).toEqual(['Theatre 1', 'Day theatre']);
    fillPatient();
    expect(await planned()).toMatchObject({ hospitalId: 'hospital-2', plan: { theatre: 'Theatre 1' } });
  });

  it('stays when another template is taken', async () => {
    render(<PlanEditor places={[larkmoor, quillhaven]} />);
    fireEvent.change(screen.getByLabelText('Hospital'), { target: { value: 'hospital-2' } });
    const template = screen.getByLabelText<HTMLSelectElement>('Template');
    fireEvent.change(template, { target: { value: template.options[1]?.value } });
    fillPatient();
    expect(await planned()).toMatchObject({ hospitalId: 'hospital-2' });
  });
});

describe('planPlaces', () => {
  const member = (hospitalId: string, role: string) => ({ hospitalId, hospitalName: hospitalId, role, timeZone: 'UTC' });
  const theatre = (hospitalId: string, name: string) => ({ hospitalId, theatreId: `${hospitalId}-${name}`, name });

  it('holds the hospitals where the person is a neurophysiologist and a theatre stands, each once', () => {
    const memberships = [member('a', 'reviewer'), member('a', 'neurophysiologist'), member('b', 'surgeon'), member('c', 'neurophysiologist')];
    expect(planPlaces({ memberships, theatres: [theatre('a', 'One'), theatre('b', 'One')] })).toEqual([{ hospitalId: 'a', hospitalName: 'a', theatreNames: ['One'] }]);
  });
});

describe('a number that cannot be read', () => {
  it.each([
    ['Position of Wrist', '46 cm', '“46 cm” is not a number: 0 to 1500 mm is allowed. A site lies distal to the most proximal one and within the length of one limb'],
    ['Position of Wrist', '', 'Empty: 0 to 1500 mm is allowed. A site lies distal to the most proximal one and within the length of one limb'],
    ['Position of Wrist', '4600', '4600: out of range: 0 to 1500 mm is allowed. A site lies distal to the most proximal one and within the length of one limb'],
    ['A test is fresh for', 'five', '“five” is not a number: 1 to 30 min is allowed'],
    ['A test is fresh for', '90', '90: out of range: 1 to 30 min is allowed'],
  ])('%s "%s": what is wrong, with which value, what is allowed', async (label, typed, sentence) => {
    render(<PlanEditor places={[larkmoor]} />);
    const field = screen.getByLabelText(label);
    fireEvent.change(field, { target: { value: typed } });
    fireEvent.blur(field);
    await waitFor(() => expect(sentenceAt(field)).toBe(sentence), patience);
    expect(planCase).not.toHaveBeenCalled();
  });

  it('takes a comma as a point', async () => {
    render(<PlanEditor places={[larkmoor]} />);
    fireEvent.change(screen.getByLabelText('A test is fresh for'), { target: { value: '4,5' } });
    fillPatient();
    expect(await planned()).toMatchObject({ plan: { rules: { freshnessMinutes: 4.5 } } });
  });
});
