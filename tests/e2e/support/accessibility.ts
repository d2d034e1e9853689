import AxeBuilder from '@axe-core/playwright';
import type { Page } from 'playwright-core';

/** WCAG 2.2 level AA, and what it builds on. */
const criteria = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

/** What axe finds wrong with what is on screen now: rule, and where. */
export async function faultsOf(page: Page): Promise<string[]> {
  // Without frames there is nothing to gather from elsewhere, which takes axe a page of its own and half a second.
  const { violations } = await new AxeBuilder({ page }).setLegacyMode().withTags(criteria).analyze();
  return violations.flatMap(({ id, nodes }) =>
    nodes.map((node) => `${id}: ${node.target.join(' ')} ${node.any[0]?.message ?? node.all[0]?.message ?? ''}`.trim()),
  );
}
