/** A demo account: invented, named by its role, never a person. */
export interface DemoPerson {
  readonly email: string;
  readonly displayName: string;
  readonly hospitalSlug: string;
  readonly role: 'neurophysiologist' | 'surgeon' | 'physician' | 'reviewer' | 'administrator';
}

/** A hospital of our own invention. */
export interface DemoHospital {
  readonly slug: string;
  readonly name: string;
  readonly timeZone: string;
}

/** One password for all demo accounts. It opens nothing outside a demo: second-factor secrets are drawn at each seeding. */
export const DEMO_PASSWORD = 'larkmoor-demo-only';

export const DEMO_HOSPITALS: readonly DemoHospital[] = [
  { slug: 'larkmoor', name: 'Larkmoor General (demo)', timeZone: 'Europe/London' },
  { slug: 'quillhaven', name: 'Quillhaven Infirmary (demo)', timeZone: 'Europe/Berlin' },
];

export const DEMO_THEATRES: readonly string[] = ['Theatre 1', 'Theatre 2', 'Theatre 3', 'Theatre 4', 'Theatre 5', 'Theatre 6'];

export const DEMO_PEOPLE: readonly DemoPerson[] = [
  { email: 'desk@demo.example', displayName: 'Neurophysiologist', hospitalSlug: 'larkmoor', role: 'neurophysiologist' },
  { email: 'surgeon@demo.example', displayName: 'Surgeon', hospitalSlug: 'larkmoor', role: 'surgeon' },
  { email: 'physician@demo.example', displayName: 'Supervising physician', hospitalSlug: 'larkmoor', role: 'physician' },
  { email: 'reviewer@demo.example', displayName: 'Reviewer', hospitalSlug: 'larkmoor', role: 'reviewer' },
  { email: 'admin@demo.example', displayName: 'Administrator', hospitalSlug: 'larkmoor', role: 'administrator' },
  { email: 'desk@other.example', displayName: 'Neurophysiologist, other hospital', hospitalSlug: 'quillhaven', role: 'neurophysiologist' },
];
