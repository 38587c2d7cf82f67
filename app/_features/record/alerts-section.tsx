import { AlertCard } from '@/app/_features/record/alert-card';
import { RecordSection } from '@/app/_features/record/record-section';
import type { CaseCourse } from '@/lib/case/course/case-course';

/** Every notice and alert, oldest first. */
export function AlertsSection({ course, timeZone }: { readonly course: CaseCourse; readonly timeZone: string }) {
  return (
    <RecordSection id="alerts" heading="Notices and alerts" isComputed>
      {course.alerts.length === 0 ? <p className="text-second">No notice and no alert was raised</p> : null}
      {course.alerts.map((alert) => <AlertCard key={alert.alertId} alert={alert} plan={course.final.plan} timeZone={timeZone} />)}
    </RecordSection>
  );
}
