import { describe, expect, test } from 'vitest';

import { checkLetterOf, newCaseReference } from '@/server/commands/case-reference';

describe('checkLetterOf', () => {
  // By hand: 2·2 + 7·3 + 4·4 + 0·5 + 2·6 + 1·7 + 8·8 = 124, 124 mod 23 = 9, the tenth of A B C D E F G H J K.
  test('is K for 2740218', () => expect(checkLetterOf('2740218')).toBe('K'));

  test('changes with every single wrong digit and every exchange of two different digits', () => {
    const digits = '2740218';
    const letter = checkLetterOf(digits);
    for (let place = 0; place < digits.length; place += 1) {
      for (const digit of '0123456789') {
        if (digit !== digits[place]) expect(checkLetterOf(digits.slice(0, place) + digit + digits.slice(place + 1))).not.toBe(letter);
      }
      for (let other = place + 1; other < digits.length; other += 1) {
        const exchanged = [...digits];
        [exchanged[place], exchanged[other]] = [digits[other] ?? '', digits[place] ?? ''];
        if (digits[place] !== digits[other]) expect(checkLetterOf(exchanged.join(''))).not.toBe(letter);
      }
    }
  });
});

test('newCaseReference has the year, five digits and their letter', () => {
  const reference = newCaseReference(Date.UTC(2027, 2, 14));
  expect(reference).toMatch(/^27-\d{5}-[A-HJ-NPR-Z]$/);
  expect(reference.at(-1)).toBe(checkLetterOf(reference.replace(/\D/g, '')));
});
