import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { Page } from 'playwright-core';

const axeSource = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

/** What axe finds on the page as it stands: rule, where, why. Evaluated by the debugger, so the page keeps its content policy. */
export async function axeViolations(page: Page): Promise<readonly string[]> {
  await page.evaluate(axeSource);
  return page.evaluate(async () => {
    const { axe } = window as unknown as { axe: { run: (root: Document) => Promise<AxeResult> } };
    const { violations } = await axe.run(document);
    return violations.flatMap((rule) => rule.nodes.map((node) => `${rule.id}: ${node.target.join(' ')}: ${node.failureSummary.replace(/\s+/g, ' ')}`));
  });
}

interface AxeResult {
  readonly violations: readonly { readonly id: string; readonly nodes: readonly { readonly target: readonly string[]; readonly failureSummary: string }[] }[];
}
