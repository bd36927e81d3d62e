import { test as base, expect, type Page } from '@playwright/test';
import { DEMO_PASSWORD } from '../../../server/demo/accounts.ts';

/** Every test fails when a page says something on its console that it should not. */
export const test = base.extend<{ quietConsole: string[] }>({
  quietConsole: [
    async ({ page }, use) => {
      const said: string[] = [];
      page.on('console', (message) => {
        if (message.type() === 'error' || message.type() === 'warning') said.push(`${page.url()}: ${message.text()}`);
      });
      page.on('pageerror', (error) => said.push(`${page.url()}: ${error.message}`));
      await use(said);
      // A refused request is logged by the browser itself; whether it was meant is the test's own matter.
      expect(said.filter((text) => !/Failed to load resource/.test(text))).toEqual([]);
    },
    { auto: true },
  ],
});

/** Signs in through the page, as one of the demonstration's accounts. */
export async function signIn(page: Page, email: string): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(DEMO_PASSWORD);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.waitForURL((url) => url.pathname !== '/sign-in');
}

/** Asks the API as whoever is signed in on the page; the body as JSON. */
export async function ask(page: Page, path: string): Promise<{ status: number; text: string }> {
  const answer = await page.request.get(path);
  return { status: answer.status(), text: await answer.text() };
}

interface Letter {
  to: string[];
  subject: string;
  links: string[];
}

/** Waits for the newest letter to an address whose subject fits. */
export async function letterTo(address: string, subject: RegExp): Promise<Letter> {
  let found: Letter | undefined;
  await expect
    .poll(
      async () => {
        const letters = (await (await fetch(`${process.env.E2E_LETTERS}/letters`)).json()) as Letter[];
        found = letters.find((letter) => letter.to.includes(address) && subject.test(letter.subject));
        return found !== undefined;
      },
      { timeout: 20_000 },
    )
    .toBe(true);
  return found!;
}

/** Speaks to the payment fake's control plane. */
export async function control(path: string, body: object): Promise<void> {
  const answer = await fetch(`${process.env.E2E_STRIPE}/control${path}`, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify(body),
  });
  expect(answer.ok, await answer.text()).toBe(true);
}

/** Fills the payment service's page. */
export async function pay(page: Page, card: string): Promise<void> {
  await page.getByLabel('Card number').fill(card);
  await page.getByLabel(/^Expiry/).fill('12/34');
  await page.getByLabel('CVC').fill('123');
  await page.getByLabel('Name on card').fill('Vera Visitor');
  await page.getByRole('button', { name: /^Pay/ }).click();
}
