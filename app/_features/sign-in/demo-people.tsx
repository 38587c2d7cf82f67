'use client';

import type { DemoPerson } from '@/lib/contracts/http/account';
import { Button } from '@/app/_ui/button';

interface DemoPeopleProps {
  readonly people: readonly DemoPerson[];
  readonly onChoose: (person: DemoPerson) => void;
}

/** The invented people of the demo with their present codes: one click fills the form. */
export function DemoPeople({ people, onChoose }: DemoPeopleProps) {
  const hospitals = [...new Set(people.map((person) => person.hospitalName))];
  return (
    <section aria-labelledby="demo-people" className="flex flex-col gap-4">
      <div>
        <h2 id="demo-people" className="text-lg font-bold">Demo people</h2>
        <p className="text-second">Invented, on this machine only. A click fills the form with the code of this half minute.</p>
      </div>
      {hospitals.map((hospital) => (
        <div key={hospital}>
          <h3 className="mb-1 text-sm text-second">{hospital}</h3>
          <ul className="border-t border-rule">
            {people.filter((person) => person.hospitalName === hospital).map((person) => (
              <li key={person.email} className="flex items-center justify-between gap-4 border-b border-rule py-1.5">
                <Button variant="plain" className="-ml-3.5" onClick={() => onChoose(person)}>{person.displayName}</Button>
                <span className="font-mono text-sm text-second">
                  <span className="sr-only">Code </span>
                  {person.code}
                </span>
              </li>
            ))}
          </ul>
        </div>
      ))}
    </section>
  );
}
