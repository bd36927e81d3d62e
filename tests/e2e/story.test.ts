import { join } from 'node:path';
import { expect, type Browser, type Page } from '@playwright/test';
import { ask, control, letterTo, pay, signIn, test } from './support/house.ts';

const RECIPE = '/books/the-hedge-book/elderberry-cordial';
const API = '/api/reading/the-hedge-book/elderberry-cordial';
const NOTES = join(import.meta.dirname, 'files/elderberry-cordial.vtt');
/** Stands in the tips only, and so nowhere before they are open. */
const CANARY = 'quillwort';
const DAY = 86_400;

/** A person at a screen of their own. */
async function sitDown(browser: Browser, email: string): Promise<Page> {
  const page = await (await browser.newContext()).newPage();
  await signIn(page, email);
  return page;
}

const dialogOf = (page: Page) => page.getByRole('dialog');
const press = (page: Page, name: string) => page.getByRole('button', { name, exact: true }).click();
const pressIn = (page: Page, name: string) => dialogOf(page).getByRole('button', { name, exact: true }).click();
const viewOf = async (page: Page) => JSON.parse((await ask(page, API)).text) as { view: string };
const stateOf = (page: Page) => page.getByRole('list', { name: 'Where this recipe is' }).locator('[aria-current=step]');

test('from the notes of a shoot to a recipe that a member has paid for, scales, and loses again', async ({
  browser,
  page: visitor,
}) => {
  test.setTimeout(180_000);
  const creator = await sitDown(browser, 'creator@demo.example');
  const editor = await sitDown(browser, 'editor@demo.example');
  const admin = await sitDown(browser, 'admin@demo.example');

  await test.step('the creator brings the notes; what are no captions is refused and loses nothing', async () => {
    await creator.goto('/workroom/shoots');
    await press(creator, 'Begin a shoot');
    await dialogOf(creator).getByLabel('Title', { exact: true }).fill('Elderberries, by the lane');
    await dialogOf(creator).getByLabel('Filmed on').fill('2026-09-12');
    await pressIn(creator, 'Begin a shoot');
    await expect(creator.getByRole('heading', { level: 1 })).toHaveText('Elderberries, by the lane');

    await press(creator, 'Bring notes');
    const file = dialogOf(creator).getByLabel('A file of notes');
    await file.setInputFiles({
      name: 'notes.vtt',
      mimeType: 'text/vtt',
      buffer: Buffer.from([0xff, 0xd8, 0xff, 0x00]),
    });
    await pressIn(creator, 'Read these notes');
    await expect(dialogOf(creator).getByRole('alert')).toContainText('These notes cannot be read');
    await file.setInputFiles(NOTES);
    await pressIn(creator, 'Read these notes');
    await expect(dialogOf(creator)).toHaveCount(0);
  });

  await test.step('the draft knows the amount that was corrected, and its second', async () => {
    const draft = creator.getByRole('region', { name: 'Draft' });
    await expect(draft.getByLabel('Title of the recipe')).toHaveValue('Elderberry cordial');
    const sugar = draft.getByRole('listitem').filter({ hasText: 'caster sugar' }).first();
    await expect(sugar).toContainText('350 g');
    await sugar.getByRole('button', { name: 'Cue at 0:38' }).click();
    await expect(creator.getByRole('button', { name: /^0:38 / })).toHaveAttribute('aria-pressed', 'true');
    await expect(creator.getByText('How much it makes was never said.')).toBeVisible();
  });

  await test.step('it becomes a recipe; the creator fills what is missing and hands it on', async () => {
    await press(creator, 'Make a recipe of it');
    await expect(creator.getByRole('heading', { level: 1 })).toHaveText('Elderberry cordial');
    await expect(creator.getByRole('link', { name: 'Notes at 0:38' }).first()).toBeVisible();
    await creator.getByRole('textbox', { name: 'Headnote' }).fill('Dark as a winter hedge, and as slow.');
    await creator.getByRole('textbox', { name: 'Tips' }).fill(`Never a leaf, never a ${CANARY}.`);
    await creator.getByRole('textbox', { name: 'As measured' }).fill('700 ml');
    await creator.getByRole('textbox', { name: 'One serving' }).fill('35 ml');
    await creator.getByRole('textbox', { name: 'Servings' }).fill('20');
    await creator
      .getByRole('radio', { name: /^Choose / })
      .first()
      .check();
    await expect(creator.getByText('Nothing is missing.')).toBeVisible();
    await press(creator, 'Put on trial');
    await expect(stateOf(creator)).toHaveText('On trial');
    await press(creator, 'Hand to the editor');
    await expect(stateOf(creator)).toHaveText('With editor');
  });

  await test.step('the editor asks; while the query is open the recipe is not cleared', async () => {
    await editor.goto('/workroom/recipes?find=elderberry');
    await editor.getByRole('link', { name: 'Elderberry cordial' }).click();
    await editor.getByLabel('Ask something').fill('Are the berries boiled through?');
    await press(editor, 'Ask');
    await expect(editor.getByText('Are the berries boiled through?')).toBeVisible();
    await press(editor, 'Clear');
    await expect(editor.getByRole('alert')).toContainText('There are open queries');

    await creator.reload();
    await press(creator, 'Answer');
    await creator.getByLabel(/^Answer to/).fill('Twenty minutes, all of them.');
    await press(creator, 'Answer');
    await expect(creator.getByText('Twenty minutes, all of them.')).toBeVisible();

    await editor.reload();
    await press(editor, 'Close the query');
    await expect(editor.getByText('Closed', { exact: true })).toBeVisible();
    await press(editor, 'Clear');
    await expect(stateOf(editor)).toHaveText('Cleared');
  });

  await test.step('the admin sets the tier that will open it, and the payment service knows it', async () => {
    await admin.goto('/office/tiers');
    await press(admin, 'Add a tier');
    await dialogOf(admin).getByLabel('Name').fill('Quarterbound');
    await dialogOf(admin).getByLabel('Rank').fill('4');
    await dialogOf(admin)
      .getByLabel(/^Price by the month/)
      .fill('9.50');
    await dialogOf(admin)
      .getByLabel(/^Price by the year/)
      .fill('95');
    await pressIn(admin, 'Save the tier');
    const row = admin.getByRole('row').filter({ hasText: 'Quarterbound' });
    await expect(row).toContainText('£9.50');
    await expect(row).toContainText('In step', { timeout: 20_000 });
  });

  await test.step('the editor binds a book around it and presses an edition, but cannot issue it', async () => {
    await editor.goto('/workroom/bindery');
    await press(editor, 'Begin a book');
    await dialogOf(editor).getByLabel('Title', { exact: true }).fill('The Hedge Book');
    await pressIn(editor, 'Begin a book');
    await expect(editor.getByRole('heading', { level: 1 })).toHaveText('The Hedge Book');
    await editor.getByRole('button', { name: 'Add a chapter' }).first().click();
    await dialogOf(editor).getByLabel('Title', { exact: true }).fill('Berries');
    await dialogOf(editor).getByLabel('Who may read it').selectOption({ label: 'Quarterbound and above' });
    await dialogOf(editor).getByLabel('Introduction').fill('What the *lane* gives in autumn.');
    await pressIn(editor, 'Add a chapter');
    await editor.getByRole('button', { name: 'Add a recipe to Berries' }).click();
    await dialogOf(editor).getByLabel('Find').fill('elderberry');
    await pressIn(editor, 'Add Elderberry cordial');
    await expect(editor.getByRole('link', { name: 'Elderberry cordial' })).toBeVisible();
    await editor.keyboard.press('Escape');
    await press(editor, 'Press an edition');
    await expect(editor.getByText('Pressed, not issued')).toBeVisible({ timeout: 40_000 });
    await expect(editor.getByRole('button', { name: 'Issue', exact: true })).toHaveCount(0);
    expect((await ask(visitor, '/api/reading/the-hedge-book')).status).not.toBe(200);
  });

  await test.step('the creator issues it', async () => {
    await creator.goto('/workroom/bindery');
    await creator.getByRole('link', { name: 'The Hedge Book' }).click();
    await press(creator, 'Issue');
    await pressIn(creator, 'Issue it');
    await expect(creator.getByText('Issued', { exact: true })).toBeVisible();
  });

  await test.step('a visitor is asked for the age before any drink is named', async () => {
    await visitor.goto(RECIPE);
    await expect(visitor.getByRole('heading', { level: 1 })).toHaveText('Are you 18 or older?');
    expect((await ask(visitor, API)).status).toBe(403);
    await press(visitor, 'Yes, I am 18 or older');
    await visitor.waitForURL(`**${RECIPE}`);
  });

  await test.step('the recipe is closed behind its teaser; what may harm is not', async () => {
    await expect(visitor.getByRole('heading', { name: 'This leaf opens with Quarterbound' })).toBeVisible();
    await expect(visitor.getByRole('heading', { name: 'Measures' })).toHaveCount(0);
    await expect(visitor.getByText('A plant that can harm', { exact: true })).toBeVisible();
    const { text } = await ask(visitor, API);
    expect(JSON.parse(text)).toMatchObject({ view: 'teaser', closed: { why: 'tier', tierName: 'Quarterbound' } });
    expect(text).not.toMatch(new RegExp(`"sections"|"steps"|"tipsHtml"|${CANARY}`));
  });

  await test.step('nor is it open to a lower tier, a free account or another role than the house’s own', async () => {
    for (const email of ['clothbound@demo.example', 'reader@demo.example']) {
      const other = await sitDown(browser, email);
      const { text } = await ask(other, API);
      expect(JSON.parse(text)).toMatchObject({ view: 'teaser' });
      expect(text).not.toContain(CANARY);
      expect((await ask(other, '/api/recipes')).status).toBe(403);
      expect((await ask(other, '/api/reading/the-hedge-book/files/epub')).status).toBe(404);
      await other.context().close();
    }
    expect((await ask(editor, '/api/office/people')).status).toBe(403);
  });

  await test.step('an account is made and its address confirmed by the letter', async () => {
    await visitor.getByRole('link', { name: 'Join Quarterbound' }).click();
    await visitor.getByRole('link', { name: 'Create one' }).first().click();
    await visitor.getByLabel('Name').fill('Vera Visitor');
    await visitor.getByLabel('E-mail address').fill('vera@visitor.example');
    await visitor.getByLabel('Password', { exact: true }).fill('a quiet evening');
    await press(visitor, 'Create the account');
    const { links } = await letterTo('vera@visitor.example', /confirm/i);
    await visitor.goto(links.find((link) => link.includes('/verify?'))!);
    await expect(visitor.getByText('Your address is confirmed.')).toBeVisible();
    expect(await viewOf(visitor)).toMatchObject({ view: 'teaser' });
  });

  await test.step('a declined card leaves no membership; another one pays, and the same recipe is open', async () => {
    await visitor.goto(RECIPE);
    await visitor.getByRole('link', { name: 'Join Quarterbound' }).click();
    await press(visitor, 'Join Quarterbound');
    await pay(visitor, '4000 0000 0000 0002');
    await expect(visitor.getByRole('alert')).toHaveText(/declined/i);
    expect(JSON.parse((await ask(visitor, `${process.env.E2E_URL}/api/account`)).text)).toMatchObject({
      membership: null,
    });
    await pay(visitor, '4242 4242 4242 4242');
    await visitor.waitForURL(`**${RECIPE}`);
    await expect(visitor.getByRole('heading', { name: 'Measures' })).toBeVisible();
    await expect(visitor.getByText(CANARY)).toBeVisible();
  });

  await test.step('it is scaled by servings and read in other units', async () => {
    const sugar = visitor.getByRole('listitem').filter({ hasText: 'caster sugar' }).first();
    await expect(sugar).toContainText('350');
    await press(visitor, 'Scale to…');
    await dialogOf(visitor).getByLabel('Servings').fill('40');
    await dialogOf(visitor).getByRole('button', { name: 'Scale', exact: true }).last().click();
    await expect(visitor.getByText('× 2').first()).toBeVisible();
    await expect(sugar).toContainText('700');
    await press(visitor, 'US');
    await expect(sugar).toContainText('oz');
  });

  await test.step('a receipt came; the membership is ended on the account page and stays open until then', async () => {
    await letterTo('vera@visitor.example', /receipt/i);
    await visitor.goto('/account');
    await expect(visitor.getByText('£9.50').first()).toBeVisible();
    await visitor.getByRole('button', { name: /^End/ }).first().click();
    await dialogOf(visitor).getByRole('button', { name: /^End/ }).click();
    await letterTo('vera@visitor.example', /end/i);
    expect(await viewOf(visitor)).toMatchObject({ view: 'open' });
  });

  await test.step('when the paid time is over, the webhook of the payment service shuts the gate', async () => {
    await control('/clock', { by: 32 * DAY });
    await expect.poll(async () => (await viewOf(visitor)).view, { timeout: 30_000 }).toBe('teaser');
    await visitor.goto(RECIPE);
    await expect(visitor.getByRole('heading', { name: 'This leaf opens with Quarterbound' })).toBeVisible();
    await expect(visitor.getByText(CANARY)).toHaveCount(0);
  });
});
