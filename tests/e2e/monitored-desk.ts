import type { Browser, BrowserContextOptions } from 'playwright-core';

import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { DeskPerson } from '@/tests/support/desk-person';
import { HttpDesk } from '@/tests/support/http-desk';

/** A desk in a browser at the log of an ulnar case in the monitoring phase, every site tested once. */
export async function openMonitoredDesk(browser: Browser, product: { readonly url: string }, options: BrowserContextOptions = {}): Promise<{ desk: DeskPerson; http: HttpDesk }> {
  const http = await HttpDesk.plan(product, { ...ulnarAtElbow, theatre: 'Theatre 1' });
  await http.openForBaseline();
  await http.ulnarBaseline();
  await http.testUlnar();
  const desk = await DeskPerson.openSignedIn(browser, product.url, 'desk@demo.example', options);
  await desk.goTo(`/cases/${http.caseId}/log`);
  await desk.focusSites();
  return { desk, http };
}
