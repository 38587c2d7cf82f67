import { describe, expect, it } from 'vitest';

import { standingText } from '@/lib/chart/standing-text';

const measured = { text: '54\u00a0m/s, short', shortText: '54\u00a0m/s' };

describe('standingText', () => {
  it('leaves a current value as it is', () => expect(standingText(measured, 'current')).toEqual(measured));
  it('says an older value in the past tense, short too', () => {
    expect(standingText(measured, 'older')).toEqual({ text: 'was 54\u00a0m/s, short', shortText: 'was 54\u00a0m/s' });
  });
  it('says that a value is not compared; without room it says only that', () => {
    expect(standingText(measured, 'not-compared')).toEqual({ text: '54\u00a0m/s, short, not compared', shortText: 'not compared' });
  });
  it('says nothing of nothing', () => expect(standingText({ text: '', shortText: '' }, 'older').text).toBe(''));
});
