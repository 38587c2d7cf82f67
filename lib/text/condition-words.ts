import type { Condition } from '@/lib/case/entry-bodies';
import { decimal, nonBreakingSpace } from '@/lib/text/format';

/** Name and value of a condition, apart, so that values can stand under one another. */
export interface ConditionWords {
  readonly name: string;
  readonly value: string;
}

/**
 * A condition in the trade's words.
 *
 * Method: copies the value with its unit. It says nothing of what the value explains; that is judged with its age.
 *
 * @param condition a logged condition; not modified
 * @returns name and value
 * @source practice of the trade: train-of-four as a count of 4, cuff up or down (common practice)
 * @accuracy temperatures to 0.1 °C, ratio to 0.01; tests/lib/text/condition-words.test.ts
 * @example
 * conditionWords({ kind: 'train-of-four', count: 4, ratio: null }).value // => '4 of 4'
 */
export function conditionWords(condition: Condition): ConditionWords {
  const withUnit = (text: string, unit: string) => `${text}${nonBreakingSpace}${unit}`;
  switch (condition.kind) {
    case 'train-of-four': {
      const ratio = condition.ratio === null ? '' : `, ratio ${decimal(condition.ratio, 2)}`;
      return { name: 'Train-of-four', value: `${condition.count} of 4${ratio}` };
    }
    case 'tourniquet': {
      const pressure = condition.pressureMmHg === null ? '' : `, ${withUnit(decimal(condition.pressureMmHg, 0), 'mmHg')}`;
      return { name: 'Tourniquet', value: `${condition.isUp ? 'up' : 'down'}${pressure}` };
    }
    case 'limb-temperature':
      return { name: 'Limb skin', value: withUnit(decimal(condition.temperatureC, 1), '°C') };
    case 'core-temperature':
      return { name: 'Core', value: withUnit(decimal(condition.temperatureC, 1), '°C') };
    case 'mean-pressure':
      return { name: 'Mean pressure', value: withUnit(decimal(condition.pressureMmHg, 0), 'mmHg') };
    case 'relaxant':
      return { name: 'Relaxant', value: condition.text };
    case 'local-anaesthetic':
      return { name: 'Local anaesthetic', value: condition.text };
    case 'other':
      return { name: 'Other', value: condition.text };
  }
}
