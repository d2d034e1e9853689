import type { Page } from 'playwright-core';
import { wedge } from '../../../scripts/running/wedge';
import type { DemonstrationSignIn } from '../../../seeds/demonstration-people';
import { see } from '../support/see';

/** Signing in, and changing the person at a station. */
export function signInPage(page: Page) {
  return {
    async signIn(person: DemonstrationSignIn): Promise<void> {
      await page.goto('/');
      await page.getByLabel('Staff number').fill(person.staffNumber);
      await page.getByLabel('Password', { exact: true }).fill(person.password);
      await page.getByRole('button', { name: 'Sign in' }).click();
      await see(page.getByRole('button', { name: `${person.name} is at this station` }));
    },

    /** Badge to the scanner, PIN on the pad: on the sign-in screen, or over any other. */
    async signInWithBadge(person: DemonstrationSignIn): Promise<void> {
      await wedge(page, person.badge);
      await page.getByLabel('PIN').waitFor();
      for (const digit of person.pin) await page.getByRole('button', { name: digit, exact: true }).click();
      await page.getByRole('button', { name: 'Sign in' }).click();
      await see(page.getByRole('button', { name: `${person.name} is at this station` }));
    },
  };
}
