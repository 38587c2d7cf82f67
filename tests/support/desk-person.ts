import type { Browser, BrowserContextOptions, Locator, Page } from 'playwright-core';

import { takeSession } from '@/tests/support/demo-session';
import { plain, withoutRunningTime } from '@/tests/support/wall-screen';
import { openWatchedPage, watchPage, type WatchedPage } from '@/tests/support/watched-page';

/** What is typed for one channel of a run: onset in ms and amplitude in the unit of its field. Null leaves it unread. */
export type TypedReading = readonly [onset: string, amplitude: string] | null;

/** A person at the desk, who finds everything by its role and its name. */
export class DeskPerson {
  private constructor(
    readonly watched: WatchedPage,
    private readonly url: string,
  ) {}

  static async open(browser: Browser, url: string, options: BrowserContextOptions = {}): Promise<DeskPerson> {
    const watched = await openWatchedPage(browser, options);
    return new DeskPerson(watched, url);
  }

  /** A browser in which this demo person signed in before. */
  static async openSignedIn(browser: Browser, url: string, email = 'desk@demo.example', options: BrowserContextOptions = {}): Promise<DeskPerson> {
    const person = await DeskPerson.open(browser, url, options);
    await takeSession(person.watched.context, { url }, email);
    return person;
  }

  /** Another tab of the same browser. */
  async openTab(): Promise<DeskPerson> {
    return new DeskPerson(watchPage(await this.watched.context.newPage()), this.url);
  }

  get page(): Page {
    return this.watched.page;
  }

  goTo(path: string): Promise<unknown> {
    return this.page.goto(this.url + path);
  }

  /** Two clicks: the demo person, then "Sign in". */
  async signIn(displayName = 'Neurophysiologist', wantedPage = '/cases'): Promise<void> {
    if (!this.page.url().includes('/sign-in')) await this.goTo('/sign-in');
    await this.button(displayName).click();
    await this.button('Sign in').click();
    await this.page.waitForURL(`**${wantedPage}`);
  }

  async signOut(): Promise<void> {
    await this.button('Sign out').click();
    await this.page.waitForURL('**/sign-in');
  }

  /** Plans a case from a template and gives its id. `change` edits the plan on the screen before it is sent. */
  async planCase(template: string, change: (person: DeskPerson) => Promise<void> = async () => undefined): Promise<string> {
    await this.goTo('/plan');
    await this.page.getByLabel('Template').selectOption({ label: template });
    await this.page.getByLabel('Patient label').fill('Invented patient');
    await this.page.getByLabel('Record number').fill('DEMO-1');
    await change(this);
    await this.button('Plan case').click();
    await this.page.waitForURL(/\/cases\/[0-9a-f-]+\/log$/);
    return /cases\/([0-9a-f-]+)\/log/.exec(this.page.url())?.[1] ?? '';
  }

  async openCase(): Promise<void> {
    await this.button('Open case').click();
    await this.button('Time-out').waitFor();
  }

  async confirmTimeout(side: 'Left' | 'Right'): Promise<void> {
    await this.inDialog('Time-out', async (dialog) => {
      await dialog.getByRole('radio', { name: side }).check();
      await dialog.getByRole('button', { name: 'Confirm patient and side' }).click();
    });
  }

  async changePhase(phase: string, reason = ''): Promise<void> {
    await this.inDialog('Phase', async (dialog) => {
      await dialog.getByRole('radio', { name: new RegExp(`^${phase}`) }).check();
      if (reason !== '') await dialog.getByLabel('Reason').fill(reason);
      await dialog.getByRole('button', { name: 'Change phase' }).click();
    });
  }

  async acceptBaseline(reason = ''): Promise<void> {
    await this.inDialog('Accept baseline', async (dialog) => {
      if (reason !== '') await dialog.getByLabel('Reason').fill(reason);
      await dialog.getByRole('button', { name: 'Accept baseline' }).click();
    });
  }

  /** Code in, words compared by this function's caller, confirmed. Gives the words that the desk shows. */
  async pairWall(code: string, compare: (words: string) => Promise<void>): Promise<void> {
    await this.button('Pair a wall').click();
    const dialog = this.page.getByRole('dialog', { name: 'Pair a wall' });
    await dialog.getByLabel('Code on the wall').fill(code);
    await dialog.getByRole('button', { name: 'Show the words' }).click();
    const confirm = dialog.getByRole('button', { name: 'The wall shows the same words' });
    await confirm.waitFor();
    await compare(plain((await dialog.locator('form p').nth(1).textContent()) ?? ''));
    await confirm.click();
    await dialog.getByText(/^Wall paired/).first().waitFor();
    await this.page.keyboard.press('Escape');
    await dialog.waitFor({ state: 'detached' });
  }

  /** The first focus; from here on the keyboard is enough. */
  async focusSites(): Promise<void> {
    await this.page.getByRole('radiogroup', { name: 'Site' }).getByRole('radio', { checked: true }).focus();
  }

  /** One run by keyboard: the site's digit, the numbers with Tab between them, Enter. Waits until it stands in the log. */
  async logRunByKeys(siteKey: string, readings: readonly TypedReading[], options: { tickSupramaximal?: boolean } = {}): Promise<void> {
    const before = await this.runCount();
    await this.typeRun(siteKey, readings, options);
    await this.page.keyboard.press('Enter');
    await this.waitForRuns(before + 1);
  }

  /** The same without the last Enter. */
  async typeRun(siteKey: string, readings: readonly TypedReading[], options: { tickSupramaximal?: boolean } = {}): Promise<void> {
    const { keyboard } = this.page;
    await keyboard.press(siteKey);
    if (options.tickSupramaximal === true) {
      for (const key of ['Shift+Tab', 'Space', 'Tab']) await keyboard.press(key);
    }
    for (const [index, reading] of readings.entries()) {
      if (index > 0) for (const key of ['Tab', 'Tab']) await keyboard.press(key);
      if (reading === null) continue;
      await keyboard.type(reading[0]);
      await keyboard.press('Tab');
      await keyboard.type(reading[1]);
    }
  }

  /** Runs in the log, waiting ones too: the lines that carry a site's name and a time. */
  async runCount(): Promise<number> {
    return (await this.runLines()).length;
  }

  async waitForRuns(count: number, withinMs = 10_000): Promise<void> {
    await this.waitFor(async () => (await this.runCount()) === count, withinMs, `${count} runs in the log`);
  }

  /** First lines of the runs, newest first: time, site, channel, mA, onset, change, amplitude, %, m/s, note. */
  async runLines(): Promise<string[][]> {
    const rows = await this.page.locator('[aria-label="Log"] tbody tr').evaluateAll((lines) => lines.map((line) => [...line.querySelectorAll('td')].map((cell) => cell.textContent ?? '')));
    return rows.filter((cells) => cells.length === 10 && cells[0] !== '').map((cells) => cells.map(plain));
  }

  /** The console as text, without what runs with the clock. */
  async picture(): Promise<string> {
    return withoutRunningTime(await this.page.getByRole('main').innerText());
  }

  button(name: string): Locator {
    return this.page.getByRole('button', { name, exact: true });
  }

  /** Opens the question behind a button, answers it, and waits until it is gone. */
  async inDialog(button: string, answer: (dialog: Locator) => Promise<void>): Promise<void> {
    await this.button(button).click();
    await this.answerDialog(answer);
  }

  /** Answers the question that is open and waits until it is gone. */
  async answerDialog(answer: (dialog: Locator) => Promise<void>): Promise<void> {
    const dialog = this.page.getByRole('dialog');
    await answer(dialog);
    await dialog.waitFor({ state: 'detached' });
  }

  async waitFor(holds: () => Promise<boolean>, withinMs: number, what: string): Promise<void> {
    const until = performance.now() + withinMs;
    while (!(await holds())) {
      if (performance.now() > until) throw new Error(`Not within ${withinMs} ms: ${what}. The page: ${(await this.page.getByRole('main').innerText()).slice(0, 2000)}`);
      await new Promise((resolve) => setTimeout(resolve, 25));
    }
  }

  close(): Promise<void> {
    return this.watched.context.close();
  }
}
