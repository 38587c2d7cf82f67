import { hash } from '@node-rs/argon2';
import type { Knex } from 'knex';
import { generateSecret } from 'otplib';
import { v7 as uuidv7 } from 'uuid';
import { DEMO_HOSPITALS, DEMO_PASSWORD, DEMO_PEOPLE, DEMO_THEATRES } from './demo-people';
import { isEmptyDatabase } from './is-empty-database';

/** How passwords are hashed; argon2id unless told otherwise. */
export interface SeedOptions {
  readonly hashPassword?: (password: string) => Promise<string>;
}

/** Puts the invented hospitals, theatres and people into an empty database, all or nothing. Throws when it is not empty. */
export async function seedDemo(admin: Knex, { hashPassword = (password) => hash(password) }: SeedOptions = {}): Promise<void> {
  await admin.transaction(async (transaction) => {
    if (!(await isEmptyDatabase(transaction))) throw new Error('The database is not empty; a demo is put into an empty one only.');
    const hospitalIds = new Map(DEMO_HOSPITALS.map(({ slug }) => [slug, uuidv7()]));
    const idOf = (slug: string): string => {
      const id = hospitalIds.get(slug);
      if (id === undefined) throw new Error(`There is no demo hospital ${slug}.`);
      return id;
    };
    await transaction('hospitals').insert(DEMO_HOSPITALS.map(({ slug, name, timeZone }) => ({ id: idOf(slug), slug, name, time_zone: timeZone })));
    await transaction('theatres').insert(
      DEMO_HOSPITALS.flatMap(({ slug }) => DEMO_THEATRES.map((name) => ({ hospital_id: idOf(slug), id: uuidv7(), name }))),
    );
    for (const { email, displayName, hospitalSlug, role } of DEMO_PEOPLE) {
      const personId = uuidv7();
      await transaction('people').insert({
        id: personId,
        email,
        display_name: displayName,
        password_hash: await hashPassword(DEMO_PASSWORD),
        second_factor_secret: generateSecret(),
        is_demo: true,
      });
      await transaction('memberships').insert({ hospital_id: idOf(hospitalSlug), person_id: personId, role });
    }
  });
}
