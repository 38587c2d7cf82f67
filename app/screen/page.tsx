import type { Metadata } from 'next';

import { TheatreScreen } from '@/app/_features/theatre/theatre-screen';

export const metadata: Metadata = { title: 'Theatre screen', robots: { index: false } };

/** The wall. Without sign-in: its own cookie binds it to one case, and it can only show. */
export default function ScreenPage() {
  return <TheatreScreen />;
}
