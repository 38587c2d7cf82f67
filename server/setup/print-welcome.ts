import { duration } from './step.mjs';

export type DemoSignIn = Readonly<{ role: string; email: string; password: string }>;

/** What a person needs next: the address, who can sign in, how a wall is paired, how to stop. */
export function printWelcome(place: { url: string; demoPeople: readonly DemoSignIn[]; afterMs: number; logFile: string }): void {
  const lines = [`\nFascicle is ready after ${duration(place.afterMs)}: ${place.url}\n`];
  if (place.demoPeople.length > 0) {
    lines.push('Demo people who can sign in (invented; the sign-in page offers them too):');
    const width = Math.max(...place.demoPeople.map(({ email }) => email.length));
    lines.push(...place.demoPeople.map(({ role, email, password }) => `  ${email.padEnd(width)}  ${password}  ${role}`));
    lines.push(`  The six-figure code: npm run code -- --for ${place.demoPeople[0]?.email}\n`);
  }
  lines.push(`Theatre screen: open ${place.url}/screen on the wall's computer. It shows a code and two words;`, '  confirm them at the desk of the case that it shall show. It needs no sign-in.\n');
  lines.push(`The server's log: ${place.logFile}`, 'Ctrl-C stops the server and its database.\n');
  process.stdout.write(`${lines.join('\n')}\n`);
}
