import { expect, it } from 'vitest';

import { acceptedBaselines } from '@/lib/text/accepted-baselines';
import { monitoredUlnar, openedCase } from '@/tests/support/ulnar-case';

it('acceptedBaselines says each acceptance once, provisional until a physician accepts it', () => {
  expect(acceptedBaselines(openedCase().state, 'UTC')).toEqual([]);
  const script = monitoredUlnar();
  const [accepted, ...rest] = acceptedBaselines(script.state, 'UTC');
  expect(rest).toEqual([]);
  expect(accepted).toMatchObject({ isProvisional: true, words: 'Through the skin, Surface, 1 cm², 10:05: axilla; above elbow; below elbow; wrist; wrist, median' });
  script.give({ name: 'confirm-baseline', baselineSeq: accepted!.seq, text: null }, { role: 'physician' });
  expect(acceptedBaselines(script.state, 'UTC')).toMatchObject([{ seq: accepted!.seq, isProvisional: false }]);
});
