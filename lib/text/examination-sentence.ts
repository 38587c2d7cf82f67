import type { Examination } from '@/lib/case/entry-bodies';
import { actionNames } from '@/lib/text/action-names';

/** Findings of sensation as they are said. Common practice. */
export const sensationNames = { normal: 'normal', reduced: 'reduced', absent: 'absent', 'not-testable': 'not testable' } as const;

/**
 * An examination of strength and sensation in one sentence.
 * @param examination what was found; not modified
 * @returns a sentence without a full stop at its end
 * @source grades of the Medical Research Council, 0 to 5 (common practice)
 * @accuracy tests/lib/text/entry-sentence.test.ts
 * @example
 * examinationSentence(examination) // => 'Examination before the operation, by the surgeon: grip 4 of 5. Little finger reduced'
 */
export function examinationSentence({ when, examinedBy, muscles, sensation, text }: Examination): string {
  const time = when === 'before-operation' ? 'before' : 'after';
  const strength = muscles.map(({ muscle, grade }) => `${muscle} ${grade} of 5`).join(', ');
  const feeling = sensation.map(({ area, finding }) => `${area} ${sensationNames[finding]}`).join(', ');
  const findings = [strength, feeling, text ?? ''].filter((words) => words !== '').join('. ');
  return `${actionNames.examination} ${time} the operation, by ${examinedBy}: ${findings}`;
}
