'use client';

import { useWatch } from 'react-hook-form';

import type { PlanForm } from '@/app/_features/plan/plan-form';
import { Section } from '@/app/_features/plan/section';
import { teamFields, type ChosenTeam, type KnownPeople } from '@/app/_features/plan/team-choice';
import { SelectField } from '@/app/_ui/select-field';

interface TeamSectionProps {
  readonly known: KnownPeople;
  readonly chosen: ChosenTeam;
  readonly onChoose: (chosen: ChosenTeam) => void;
}

/** Who takes part besides the planner. They see the case from its planning on. */
export function TeamSection({ known, chosen, onChoose }: TeamSectionProps) {
  const hospitalId = useWatch<PlanForm, 'hospitalId'>({ name: 'hospitalId' });
  const here = known.people.filter((one) => one.hospitalId === hospitalId);
  return (
    <Section title="Team" text="They see the case from its planning on. Without a physician the baseline stays provisional and nobody gives advice.">
      {known.problem === null ? null : <p role="alert" className="mb-3 border-l-4 border-ink pl-3 font-semibold">{`${known.problem} The case can be planned without them.`}</p>}
      <div className="grid gap-x-6 gap-y-4 md:grid-cols-3">
        {teamFields.map(({ key, label, role }) => {
          const fitting = here.filter((one) => one.role === role);
          const nobody = known.isPending ? 'Fetching the people' : fitting.length === 0 ? 'Nobody with this role' : 'Not chosen';
          return (
            <SelectField
              key={key}
              label={label}
              value={fitting.some(({ personId }) => personId === chosen[key]) ? chosen[key] : ''}
              onChange={(event) => onChoose({ ...chosen, [key]: event.currentTarget.value })}
              options={[{ value: '', label: nobody }, ...fitting.map(({ personId, displayName }) => ({ value: personId, label: displayName }))]}
            />
          );
        })}
      </div>
    </Section>
  );
}
