import { describe, expect, it } from 'vitest';

import { wallSettings } from '@/app/_features/theatre/wall-settings';

describe('wallSettings', () => {
  it('is a 55-inch display at 3 m in the dark theme when nothing is said', () => {
    expect(wallSettings('', null)).toEqual({ distanceM: 3, diagonalInch: 55, theme: 'theatre' });
  });
  it('takes what the address says', () => {
    expect(wallSettings('?distance=4.5&diagonal=32&theme=paper', null)).toEqual({ distanceM: 4.5, diagonalInch: 32, theme: 'paper' });
  });
  it('keeps what an earlier address said, one by one', () => {
    expect(wallSettings('?distance=2', 'distance=5&diagonal=32&theme=paper')).toEqual({ distanceM: 2, diagonalInch: 32, theme: 'paper' });
  });
  it.each(['?distance=0.4', '?distance=11', '?distance=far', '?diagonal=4', '?diagonal=121', '?theme=pink'])('leaves out %s', (search) => {
    expect(wallSettings(search, null)).toEqual({ distanceM: 3, diagonalInch: 55, theme: 'theatre' });
  });
});
