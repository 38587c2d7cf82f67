import { DEMO_PASSWORD, DEMO_PEOPLE } from '@/db/seeds/demo-people';
import { duration } from './step.mjs';

/** What a person needs next: the address, who can sign in, how a wall is paired, how to stop. */
export function printWelcome(place: { url: string; isDemo: boolean; hasOwnDatabase: boolean; afterMs: number; logFile: string }): void {
  const lines = [
    `\nFascicle is ready after ${duration(place.afterMs)}: ${place.url}\n`,
    ...(place.isDemo ? demoLines() : []),
    `Theatre screen: open ${place.url}/screen on the wall's computer. It needs no sign-in and shows a code and two words;`,
    '  compare them at the desk, in the case that the screen shall show, and confirm.\n',
    `The server's log: ${place.logFile}`,
    `Ctrl-C stops the server${place.hasOwnDatabase ? ' and its database' : '; the database goes on'}.\n`,
  ];
  process.stdout.write(`${lines.join('\n')}\n`);
}

function demoLines(): string[] {
  const width = Math.max(...DEMO_PEOPLE.map(({ email }) => email.length));
  return [
    `Demo people, all with the password ${DEMO_PASSWORD} (the sign-in page offers them too):`,
    ...DEMO_PEOPLE.map(({ email, displayName }) => `  ${email.padEnd(width)}  ${displayName}`),
    `  The six figures asked for after the password: npm run code -- --for ${DEMO_PEOPLE[0]?.email}\n`,
  ];
}
