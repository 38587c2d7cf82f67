import { describe, expect, it } from 'vitest';

import { alertCourses } from '@/lib/case/course/alert-courses';
import { courseEntries } from '@/lib/case/course/course-entries';
import { alertMoments } from '@/lib/text/alert-moments';
import { everyKindCase } from '@/tests/lib/case/every-kind';

describe('alertMoments', () => {
  it('alertMoments tells the moments in the order of their times, those of one second together', () => {
    const [, alert] = alertCourses(courseEntries(everyKindCase().entries));
    expect(alertMoments(alert!).map(({ at, names, isRaise }) => [at.slice(11, 19), names.join(', '), isRaise])).toEqual([
      ['10:41:55', 'First bad, Notice', false],
      ['10:42:12', 'Alert, Painted', true],
      ['10:42:21', 'Told', false],
      ['10:42:25', 'Read back', false],
      ['10:42:29', 'Surgeon’s action', false],
      ['10:44:00', 'Tested again, Alert worse', true],
      ['10:46:00', 'Back inside limits', false],
      ['10:46:01', 'End', false],
    ]);
  });
});
