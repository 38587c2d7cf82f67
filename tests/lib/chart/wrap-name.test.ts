import { describe, expect, it } from 'vitest';

import { wrapName } from '@/lib/chart/wrap-name';

describe('wrapName', () => {
  it.each([
    ['Wrist', ['Wrist']],
    ['Above elbow', ['Above', 'elbow']],
    ['Lateral part, above field', ['Lateral part,', 'above field']],
    ['Opposite fibular head', ['Opposite', 'fibular head']],
  ])('breaks "%s" where its lines are most equal', (name, lines) => expect(wrapName(name)).toEqual(lines));
});
