import type { Examination } from '@/lib/case/entry-bodies';
import type { CasePlan } from '@/lib/case/plan';
import type { PersonCommand } from '@/lib/contracts/http/commands';
import { skinAreas } from '@/lib/reference/skin-areas';

type Command = PersonCommand & { name: 'record-examination' };
type Finding = Examination['sensation'][number]['finding'];

/** What is chosen for one muscle or area; empty is not examined. */
export interface ExaminedRow {
  readonly name: string;
  readonly finding: string;
}

/** An examination while it is filled in. */
export interface ExaminationDraft {
  readonly when: Examination['when'];
  readonly examinedBy: string;
  readonly muscles: readonly ExaminedRow[];
  readonly areas: readonly ExaminedRow[];
  readonly text: string;
}

/** Grades of the Medical Research Council as they are taught, in words (common practice). */
export const gradeOptions = [
  { value: '', label: 'Not examined' },
  { value: '5', label: '5, full strength' },
  { value: '4', label: '4, against resistance' },
  { value: '3', label: '3, against gravity' },
  { value: '2', label: '2, without gravity' },
  { value: '1', label: '1, flicker' },
  { value: '0', label: '0, no contraction' },
] as const;

/** Findings of sensation. */
export const findingOptions = [
  { value: '', label: 'Not examined' },
  { value: 'normal', label: 'Normal' },
  { value: 'reduced', label: 'Reduced' },
  { value: 'absent', label: 'Absent' },
  { value: 'not-testable', label: 'Not testable' },
] as const;

/** Nothing examined yet: the muscles that are recorded, the areas of the planned nerves, and a free line of each. */
export function emptyExamination(plan: CasePlan, when: Examination['when']): ExaminationDraft {
  const muscles = plan.channels.filter(({ kind }) => kind === 'muscle').map(({ longName, name }) => (longName === '' ? name : longName));
  const areas = skinAreas.filter(({ nerve }) => plan.nerves.some(({ name }) => name.toLowerCase().includes(nerve))).map(({ area }) => area);
  const rows = (names: readonly string[]) => [...new Set(names), ''].map((name) => ({ name, finding: '' }));
  return { when, examinedBy: '', muscles: rows(muscles), areas: rows(areas), text: '' };
}

/** The command of a filled-in examination, or the sentence that says what is missing. */
export function examinationCommand(draft: ExaminationDraft): Command | string {
  const nameless = [...draft.muscles, ...draft.areas].find(({ name, finding }) => finding !== '' && name.trim() === '');
  if (nameless !== undefined) return 'Name missing: say which muscle or area the finding belongs to';
  const muscles = draft.muscles.filter(({ finding }) => finding !== '').map(({ name, finding }) => ({ muscle: name.trim(), grade: Number(finding) }));
  const sensation = draft.areas.filter(({ finding }) => finding !== '').map(({ name, finding }) => ({ area: name.trim(), finding: finding as Finding }));
  const text = draft.text.trim() === '' ? null : draft.text;
  if (muscles.length + sensation.length === 0 && text === null) return 'Nothing examined: a muscle, an area of skin or a text is needed';
  if (draft.examinedBy.trim() === '') return 'Examiner missing: say by role who examined, for example surgeon';
  return { name: 'record-examination', examination: { when: draft.when, examinedBy: draft.examinedBy, muscles, sensation, text } };
}
