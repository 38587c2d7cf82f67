import { describe, expect, it } from 'vitest';

import type { Condition } from '@/lib/case/entry-bodies';
import { conditionWords } from '@/lib/text/condition-words';

describe('conditionWords', () => {
  it.each<[Condition, string, string]>([
    [{ kind: 'train-of-four', count: 4, ratio: 0.92 }, 'Train-of-four', '4 of 4, ratio 0.92'],
    [{ kind: 'tourniquet', isUp: true, pressureMmHg: 250 }, 'Tourniquet', 'up, 250 mmHg'],
    [{ kind: 'tourniquet', isUp: false, pressureMmHg: null }, 'Tourniquet', 'down'],
    [{ kind: 'limb-temperature', temperatureC: 32.4 }, 'Limb skin', '32.4 °C'],
    [{ kind: 'core-temperature', temperatureC: 36 }, 'Core', '36.0 °C'],
    [{ kind: 'mean-pressure', pressureMmHg: 78 }, 'Mean pressure', '78 mmHg'],
    [{ kind: 'relaxant', text: 'none since induction' }, 'Relaxant', 'none since induction'],
    [{ kind: 'local-anaesthetic', text: 'skin only' }, 'Local anaesthetic', 'skin only'],
    [{ kind: 'other', text: 'arm moved' }, 'Other', 'arm moved'],
  ])('says %o as name and value', (condition, name, value) => {
    const words = conditionWords(condition);
    expect([words.name, words.value.replaceAll('\u00a0', ' ')]).toEqual([name, value]);
  });
});
