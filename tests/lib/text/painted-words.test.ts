import { expect, it } from 'vitest';

import { paintedWords } from '@/lib/text/painted-words';
import { clock } from '@/tests/support/case-builder';

const wordAt = clock('10:41:20');
const at = (time: string) => Date.parse(clock(time));

it.each([
  ['nothing in the first seconds', null, true, '10:41:23.499', null],
  ['that it is missing, from 3.5 s on', null, true, '10:41:23.500', { text: 'Wall not confirmed', isMissing: true }],
  ['nothing without a wall', null, false, '10:45', null],
  ['when it was painted, however late', clock('10:41:50'), true, '10:45', { text: 'On the wall 10:41:50', isMissing: false }],
  ['when it was painted, also by a wall that has ended since', clock('10:41:21'), false, '10:45', { text: 'On the wall 10:41:21', isMissing: false }],
] as const)('paintedWords says %s', (_what, paintedAt, hasWall, now, words) => {
  expect(paintedWords({ paintedAt }, { hasWall, wordAt }, at(now), 'UTC')).toEqual(words);
});
