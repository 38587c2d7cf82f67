import { describe, expect, it } from 'vitest';

import { conditionRows } from '@/lib/text/condition-rows';

const at = '2027-03-14T10:37:00.000Z';

describe('conditionRows', () => {
  it('says of each usual condition that it was never measured', () => {
    expect(conditionRows({}).map(({ name, value, at: when }) => [name, value, when])).toEqual([
      ['Train-of-four', null, null],
      ['Tourniquet', null, null],
      ['Limb skin', null, null],
      ['Mean pressure', null, null],
    ]);
  });

  it('shows what was measured with its time, and what is not usual last', () => {
    const rows = conditionRows({
      'core-temperature': { seq: 8, at, condition: { kind: 'core-temperature', temperatureC: 36.4 } },
      'mean-pressure': { seq: 9, at, condition: { kind: 'mean-pressure', pressureMmHg: 78 } },
    });
    expect(rows.map(({ kind, at: when }) => [kind, when])).toEqual([
      ['train-of-four', null], ['tourniquet', null], ['limb-temperature', null], ['mean-pressure', at], ['core-temperature', at],
    ]);
    expect(rows[3]?.value).toMatch(/^78\smmHg$/);
    expect(rows[4]?.value).toMatch(/^36\.4\s°C$/);
  });
});
