'use client';

import { useState } from 'react';
import { FormProvider, useForm } from 'react-hook-form';

import { CaseFields } from '@/app/_features/plan/case-fields';
import { ChannelsTable } from '@/app/_features/plan/channels-table';
import { NervesSection } from '@/app/_features/plan/nerves-section';
import { formFromTemplate, templateOf, type PlanForm } from '@/app/_features/plan/plan-form';
import type { PlanPlace } from '@/app/_features/plan/plan-places';
import { planResolver } from '@/app/_features/plan/plan-resolver';
import { RulesSection } from '@/app/_features/plan/rules-section';
import { StepsTable } from '@/app/_features/plan/steps-table';
import { StimulusFields } from '@/app/_features/plan/stimulus-fields';
import { noPeopleKnown, nobodyChosen, teamFrom, type KnownPeople } from '@/app/_features/plan/team-choice';
import { TeamSection } from '@/app/_features/plan/team-section';
import { usePlanCase } from '@/app/_features/plan/use-plan-case';
import { Button } from '@/app/_ui/button';
import { templates } from '@/lib/reference/templates/templates';

/** The whole plan of a case on one page; everything a template brings can be changed here. */
export function PlanEditor({ places, known = noPeopleKnown }: { readonly places: readonly PlanPlace[]; readonly known?: KnownPeople }) {
  const [first] = places;
  const start = formFromTemplate(templateOf(templates[0]?.templateId ?? ''));
  const form = useForm<PlanForm>({
    defaultValues: { ...start, hospitalId: first?.hospitalId ?? '', plan: { ...start.plan, theatre: first?.theatreNames[0] ?? '' } },
    resolver: planResolver,
    mode: 'onBlur',
    reValidateMode: 'onChange',
  });
  const [chosen, setChosen] = useState(nobodyChosen);
  const { send, problem, isSending } = usePlanCase();
  const { errors } = form.formState;
  const count = Object.keys(errors).filter((key) => key !== 'root').length;
  const sentence = problem ?? errors.root?.message ?? (count > 0 ? 'Not planned yet: a field above has a sentence that says what is allowed' : null);

  const plan = ({ plan, identity, hospitalId }: PlanForm) => {
    const team = teamFrom(chosen, hospitalId, known.people);
    return send({ plan, identity, ...(team.length === 0 ? {} : { team }), ...(places.length > 1 ? { hospitalId } : {}) });
  };
  const chooseTemplate = (templateId: string) => {
    const { plan, identity, hospitalId } = form.getValues();
    form.reset(formFromTemplate(templateOf(templateId), { identity, hospitalId, side: plan.side, theatre: plan.theatre }));
  };
  return (
    <FormProvider {...form}>
      <form
        method="post"
        noValidate
        onSubmit={(event) => void form.handleSubmit(plan)(event)}
        className="mx-auto flex w-full max-w-7xl flex-col px-6 pt-8"
      >
        <h1 className="text-2xl font-bold">Plan a case</h1>
        <CaseFields places={places} onTemplate={chooseTemplate} />
        <TeamSection known={known} chosen={chosen} onChoose={setChosen} />
        <NervesSection />
        <ChannelsTable />
        <StepsTable />
        <StimulusFields />
        <RulesSection />
        <div className="sticky bottom-0 flex flex-wrap items-center gap-5 border-t border-rule bg-ground py-4">
          <Button type="submit" variant="primary" disabled={isSending}>{isSending ? 'Planning' : 'Plan case'}</Button>
          {sentence === null ? <p className="text-second">The log opens next: the examination is recorded there. Nothing is monitored before the case is opened.</p> : <p role="alert" className="border-l-4 border-ink pl-3 font-semibold">{sentence}</p>}
        </div>
      </form>
    </FormProvider>
  );
}
