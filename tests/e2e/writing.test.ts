import { expect, type Page } from '@playwright/test';
import { signIn, test } from './support/house.ts';

/** Begins a recipe through the API, as whoever is signed in; its id. */
async function begin(page: Page, title: string): Promise<string> {
  const answer = await page.request.post('/api/recipes', {
    data: { from: 'blank', title, kind: 'shrub' },
    headers: { origin: process.env.E2E_URL! },
  });
  return ((await answer.json()) as { id: string }).id;
}

const amountOf = (page: Page, line: number) => page.getByLabel('Amount and unit').nth(line);
const headnoteOf = (page: Page) => page.getByRole('textbox', { name: 'Headnote' });
const save = (page: Page) => page.getByRole('button', { name: 'Save', exact: true }).click();
const saved = (page: Page) => expect(page.getByRole('status').filter({ hasText: /^Saved \d/ })).toBeVisible();

test('a recipe is typed from the keys; a unit that does not exist holds saving back and says so', async ({ page }) => {
  await signIn(page, 'creator@demo.example');
  await page.goto(`/workroom/recipes/${await begin(page, 'Damson shrub')}`);
  await page.getByRole('button', { name: 'Add a line' }).click();
  for (const key of [
    '400 g',
    'Tab',
    'damsons',
    'Enter',
    '3 glugs',
    'Tab',
    'caster sugar',
    'Enter',
    '300 ml',
    'Tab',
    'cider vinegar',
  ])
    await (key === 'Tab' || key === 'Enter' ? page.keyboard.press(key) : page.keyboard.type(key));
  await page.keyboard.press('Control+s');
  await expect(page.getByRole('alert')).toContainText('There is no unit “glugs”.');
  await page.getByRole('link', { name: /glugs/ }).click();
  await expect(amountOf(page, 1)).toBeFocused();
  await expect(amountOf(page, 1)).toHaveValue('3 glugs');

  await amountOf(page, 1).fill('1½ cups');
  await page.keyboard.press('Control+s');
  await saved(page);
  await page.reload();
  await expect(amountOf(page, 0)).toHaveValue('400 g');
  await expect(amountOf(page, 1)).toHaveValue('1½ cups');
  await expect(page.getByText('larder: caster sugar')).toBeVisible();
});

test('two editors save the same recipe: the second sees what the first wrote, and nothing of either is lost', async ({
  browser,
}) => {
  const [odd, isla] = (await Promise.all(
    ['editor@demo.example', 'creator@demo.example'].map(async (email) => {
      const page = await (await browser.newContext()).newPage();
      await signIn(page, email);
      return page;
    }),
  )) as [Page, Page];
  const address = `/workroom/recipes/${await begin(odd, 'Quince shrub')}`;
  await odd.goto(address);
  await odd.getByRole('button', { name: 'Add a line' }).click();
  await odd.keyboard.type('500 g');
  await odd.keyboard.press('Tab');
  await odd.keyboard.type('quinces');
  await save(odd);
  await saved(odd);

  await isla.goto(address);
  await expect(amountOf(isla, 0)).toHaveValue('500 g');
  await headnoteOf(odd).fill('Waits until Christmas.');
  await amountOf(odd, 0).fill('600 g');
  await save(odd);
  await saved(odd);

  await isla.getByRole('textbox', { name: 'Tips' }).fill('Rub off the down.');
  await amountOf(isla, 0).fill('550 g');
  await save(isla);
  const panel = isla.getByRole('alert', { name: 'Somebody else saved in the meantime' });
  await expect(panel).toContainText('Odd Fenwick saved this recipe');
  await expect(panel.getByRole('group', { name: 'Line: quinces' })).toContainText('550 g');
  await expect(panel.getByRole('group', { name: 'Line: quinces' })).toContainText('600 g');
  await expect(panel).toContainText('Waits until Christmas.');

  await panel.getByRole('radio', { name: /Theirs/ }).check();
  await panel.getByRole('button', { name: 'Save both together' }).click();
  await saved(isla);
  await odd.reload();
  await expect(headnoteOf(odd)).toHaveValue('Waits until Christmas.');
  await expect(odd.getByRole('textbox', { name: 'Tips' })).toHaveValue('Rub off the down.');
  await expect(amountOf(odd, 0)).toHaveValue('600 g');
});

test('text that was not saved is asked for before leaving, and kept through a crash', async ({ page }) => {
  await signIn(page, 'editor@demo.example');
  const address = `/workroom/recipes/${await begin(page, 'Medlar shrub')}`;
  await page.goto(address);
  await headnoteOf(page).fill('Bletted first.');
  await page.getByRole('link', { name: 'Larder' }).first().click();
  await page.getByRole('dialog').getByRole('button', { name: 'Stay' }).click();
  await expect(headnoteOf(page)).toHaveValue('Bletted first.');

  await expect
    .poll(() => page.evaluate(() => Object.keys(localStorage).filter((key) => key.startsWith('recipe-text:')).length))
    .toBe(1);
  // The tab is gone without a question, as when a machine loses power.
  const later = await page.context().newPage();
  await page.close({ runBeforeUnload: false });
  await later.goto(address);
  await later.getByRole('button', { name: 'Take it up' }).click();
  await expect(headnoteOf(later)).toHaveValue('Bletted first.');
});
