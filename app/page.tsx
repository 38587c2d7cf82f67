import { redirect } from 'next/navigation';

/** The list of cases is the way in. */
export default function HomePage() {
  redirect('/cases');
}
