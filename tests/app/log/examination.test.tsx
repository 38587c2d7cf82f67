import { cleanup, fireEvent, screen, waitFor } from '@testing-library/react';
import { afterEach, expect, it } from 'vitest';

import { examinationCommand, emptyExamination } from '@/app/_features/log/examination-draft';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { openedCase } from '@/tests/support/ulnar-case';
import { renderConsole } from './render-console';

afterEach(cleanup);
const blank = emptyExamination(ulnarAtElbow, 'before-operation');

it('emptyExamination offers the recorded muscles and the areas of the planned nerves, nothing examined', () => {
  expect(blank.areas.map(({ name }) => name)).toEqual(['Little finger', 'Tip of the index finger', '']);
  expect(blank.muscles.map(({ name }) => name)).toContain('Abductor digiti minimi');
  expect([...blank.muscles, ...blank.areas].every(({ finding }) => finding === '')).toBe(true);
});

it.each([
  ['nothing was examined', {}, /^Nothing examined/],
  ['nobody examined', { text: 'Grip weak' }, /^Examiner missing/],
  ['a finding has no name', { examinedBy: 'surgeon', areas: [{ name: ' ', finding: 'reduced' }] }, /^Name missing/],
] as const)('examinationCommand says when %s', (_what, change, sentence) => {
  expect(examinationCommand({ ...blank, ...change })).toMatch(sentence);
});

it('the question gives what was found, and leaves out what was not examined', async () => {
  const { given } = renderConsole(openedCase(), { Examination: { kind: 'examination' } });
  fireEvent.click(screen.getByRole('button', { name: 'Examination' }));
  fireEvent.change(await screen.findByLabelText('Examined by, as a role'), { target: { value: 'surgeon' } });
  fireEvent.change(screen.getByLabelText('First dorsal interosseous'), { target: { value: '4' } });
  fireEvent.change(screen.getByLabelText('Little finger'), { target: { value: 'reduced' } });
  fireEvent.change(screen.getByLabelText('Other area 1'), { target: { value: 'Palm' } });
  fireEvent.change(screen.getByLabelText('Finding of other area 1'), { target: { value: 'normal' } });
  expect(screen.getByLabelText('Other area 2')).toBeDefined();
  fireEvent.click(screen.getByRole('button', { name: /^Log examination/ }));
  await waitFor(() => expect(given).toHaveLength(1));
  expect(given[0]).toEqual({
    name: 'record-examination',
    examination: {
      when: 'before-operation',
      examinedBy: 'surgeon',
      muscles: [{ muscle: 'First dorsal interosseous', grade: 4 }],
      sensation: [{ area: 'Little finger', finding: 'reduced' }, { area: 'Palm', finding: 'normal' }],
      text: null,
    },
  });
});
