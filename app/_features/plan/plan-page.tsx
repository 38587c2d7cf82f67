'use client';

import { useQuery } from '@tanstack/react-query';

import { PlanEditor } from '@/app/_features/plan/plan-editor';
import { planPlaces } from '@/app/_features/plan/plan-places';
import { readPeople, readSession } from '@/app/_live/api';
import { EmptyState } from '@/app/_ui/empty-state';
import { NoticeBar } from '@/app/_ui/notice-bar';
import { Skeleton } from '@/app/_ui/skeleton';

/** Planning starts when it is known in which theatres this person works. */
export function PlanPage() {
  const session = useQuery({ queryKey: ['session'], queryFn: () => readSession() });
  const people = useQuery({ queryKey: ['people'], queryFn: readPeople });
  if (session.isPending) return <Skeleton label="Fetching your theatres" rows={8} className="mx-auto w-full max-w-7xl px-6 py-8" />;
  if (session.isError) return <NoticeBar tone="strong">{session.error.message}</NoticeBar>;
  const places = planPlaces(session.data);
  if (places.length === 0) {
    return (
      <div className="mx-auto w-full max-w-7xl px-6 py-8">
        <EmptyState title="No theatre to plan for" text="A case is planned by a neurophysiologist, for a theatre of their hospital. Your account has none; the administrator can add one." />
      </div>
    );
  }
  const others = (people.data?.people ?? []).filter(({ personId }) => personId !== session.data.personId);
  return <PlanEditor places={places} known={{ people: others, isPending: people.isPending, problem: people.error?.message ?? null }} />;
}
