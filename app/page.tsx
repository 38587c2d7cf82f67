import { redirect } from 'next/navigation';

import { homeOf } from '@/app/(desk)/page-links';
import { requirePerson } from '@/app/(desk)/require-person';

/** The way in: each person comes to the page of their work. */
export default async function HomePage() {
  redirect(homeOf(await requirePerson()));
}
