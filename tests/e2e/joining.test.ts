import { expect } from '@playwright/test';
import { ask, control, letterTo, pay, signIn, test } from './support/house.ts';

const RECIPE = '/books/slack-water/whitecap-sour';
const API = '/api/reading/slack-water/whitecap-sour';
const DAY = 86_400;

test('a visitor joins from a locked recipe, reads and scales it, leaves, and loses it when the paid time is over', async ({
  page,
}) => {
  await test.step('the age is asked before any drink is named', async () => {
    await page.goto(RECIPE);
    await expect(page.getByRole('heading', { level: 1 })).toHaveText('Are you 18 or older?');
    expect((await ask(page, API)).status).toBe(403);
    await page.getByRole('button', { name: 'Yes, I am 18 or older' }).click();
    await page.waitForURL(`**${RECIPE}`);
  });

  await test.step('the recipe is closed behind its teaser; allergens and cautions are not', async () => {
    await expect(page.getByRole('heading', { name: 'This leaf opens with Sewn' })).toBeVisible();
    await expect(page.getByText('Raw egg', { exact: true })).toBeVisible();
    await expect(page.getByRole('heading', { name: 'Measures' })).toHaveCount(0);
    const { text } = await ask(page, API);
    expect(JSON.parse(text)).toMatchObject({ view: 'teaser', closed: { why: 'tier', tierName: 'Sewn' } });
    expect(text).not.toMatch(/"sections"|"steps"|"tipsHtml"/);
  });

  await test.step('an account is made and its address confirmed by the letter', async () => {
    await page.getByRole('link', { name: 'Join Sewn' }).click();
    await page.getByRole('link', { name: 'Create one' }).first().click();
    await page.getByLabel('Name').fill('Vera Visitor');
    await page.getByLabel('E-mail address').fill('vera@visitor.example');
    await page.getByLabel('Password', { exact: true }).fill('a quiet evening');
    await page.getByRole('button', { name: 'Create the account' }).click();
    const { links } = await letterTo('vera@visitor.example', /confirm/i);
    await page.goto(links.find((link) => link.includes('/verify?'))!);
    await expect(page.getByText('Your address is confirmed.')).toBeVisible();
  });

  await test.step('a declined card leaves no membership, another one pays, and the recipe is open', async () => {
    await page.goto(RECIPE);
    await page.getByRole('link', { name: 'Join Sewn' }).click();
    await page.getByRole('button', { name: 'Join Sewn' }).click();
    await pay(page, '4000 0000 0000 0002');
    await expect(page.getByRole('alert')).toHaveText(/declined/i);
    expect(JSON.parse((await ask(page, `${process.env.E2E_URL}/api/account`)).text).membership).toBeNull();
    await pay(page, '4242 4242 4242 4242');
    await page.waitForURL(`**${RECIPE}`);
    await expect(page.getByRole('heading', { name: 'Measures' })).toBeVisible();
  });

  await test.step('it is scaled by servings and read in other units', async () => {
    const egg = page.getByRole('listitem').filter({ hasText: /gin/i }).first();
    const before = await egg.innerText();
    await page.getByRole('button', { name: 'Scale to…' }).first().click();
    await page.getByLabel('Servings').fill('4');
    await page.getByRole('dialog').getByRole('button', { name: 'Scale', exact: true }).last().click();
    await expect(page.getByText('× 4').first()).toBeVisible();
    await expect(egg).not.toHaveText(before);
    await page.getByRole('button', { name: 'US', exact: true }).click();
    await expect(egg).toContainText('fl oz');
  });

  await test.step('a receipt came, and a higher tier stays closed', async () => {
    await letterTo('vera@visitor.example', /receipt/i);
    expect(JSON.parse((await ask(page, '/api/reading/slack-water/still-water')).text).view).toBe('teaser');
  });

  await test.step('cancelled, it is open to the end of what was paid, and shut by the webhook after it', async () => {
    await page.goto('/account');
    await page
      .getByRole('button', { name: /^(End|Cancel)/ })
      .first()
      .click();
    await page
      .getByRole('dialog')
      .getByRole('button', { name: /^(End|Cancel)/ })
      .click();
    await letterTo('vera@visitor.example', /end/i);
    expect(JSON.parse((await ask(page, API)).text).view).toBe('open');
    await control('/clock', { by: 32 * DAY });
    await expect
      .poll(async () => JSON.parse((await ask(page, API)).text).view as string, { timeout: 30_000 })
      .toBe('teaser');
    await page.goto(RECIPE);
    await expect(page.getByRole('heading', { name: 'This leaf opens with Sewn' })).toBeVisible();
  });
});

test('a lower tier and a free account are refused what a higher tier opens', async ({ page }) => {
  for (const email of ['member@demo.example', 'reader@demo.example']) {
    await signIn(page, email);
    expect(JSON.parse((await ask(page, '/api/reading/slack-water/whitecap-sour')).text).view).toBe('teaser');
    expect((await ask(page, '/api/reading/slack-water/files/epub')).status).toBe(404);
    expect((await ask(page, '/api/recipes')).status).toBe(403);
    await page.request.delete('/api/session', { headers: { origin: process.env.E2E_URL! } });
  }
});
