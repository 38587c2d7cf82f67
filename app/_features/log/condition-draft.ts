import type { ConditionKind } from '@/app/_features/log/log-dialog';
import { readNumber } from '@/app/_features/log/read-number';
import type { Condition } from '@/lib/case/entry-bodies';
import type { BoundedQuantity } from '@/lib/units/bounds';

/** A condition as it is typed. */
export interface ConditionDraft {
  readonly kind: ConditionKind;
  readonly number: string;
  readonly ratio: string;
  readonly cuff: 'up' | 'down' | null;
  readonly text: string;
  readonly reportedBy: string;
}

export const emptyConditionDraft: ConditionDraft = { kind: 'train-of-four', number: '', ratio: '', cuff: null, text: '', reportedBy: '' };

/** The condition that a draft stands for, or the sentence that says what is missing. */
export function conditionFrom(draft: ConditionDraft): Condition | string {
  switch (draft.kind) {
    case 'train-of-four': {
      const count = need(draft.number, 'trainOfFourCount', 'Count');
      if (typeof count === 'string') return count;
      if (!Number.isInteger(count)) return `${count} is no count: 0, 1, 2, 3 or 4 is allowed`;
      const ratio = may(draft.ratio, 'trainOfFourRatio');
      return typeof ratio === 'string' ? ratio : { kind: 'train-of-four', count, ratio };
    }
    case 'tourniquet': {
      if (draft.cuff === null) return 'Cuff missing: up or down';
      const pressureMmHg = may(draft.number, 'cuffPressureMmHg');
      return typeof pressureMmHg === 'string' ? pressureMmHg : { kind: 'tourniquet', isUp: draft.cuff === 'up', pressureMmHg };
    }
    case 'limb-temperature':
    case 'core-temperature': {
      const temperatureC = need(draft.number, 'temperatureC', 'Temperature');
      return typeof temperatureC === 'string' ? temperatureC : { kind: draft.kind, temperatureC };
    }
    case 'mean-pressure': {
      const pressureMmHg = need(draft.number, 'meanPressureMmHg', 'Mean pressure');
      return typeof pressureMmHg === 'string' ? pressureMmHg : { kind: 'mean-pressure', pressureMmHg };
    }
    default:
      return draft.text.trim() === '' ? 'Words missing: say what was reported' : { kind: draft.kind, text: draft.text.trim() };
  }
}

function may(typed: string, quantity: BoundedQuantity): number | null | string {
  const number = readNumber(typed, quantity);
  if (number.kind === 'empty') return null;
  return number.kind === 'wrong' ? number.sentence : number.value;
}

function need(typed: string, quantity: BoundedQuantity, noun: string): number | string {
  return may(typed, quantity) ?? `${noun} is empty: type the value that was measured`;
}
