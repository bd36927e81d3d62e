import { AxeBuilder } from '@axe-core/playwright';
import { expect, type Page } from '@playwright/test';
import { signIn, test } from './support/house.ts';

interface Walk {
  who: string | null;
  pages: string[];
}

/** Pages by who may open them; `:recipe`, `:shoot`, `:book` stand for the first of the demonstration. */
const WALKS: Walk[] = [
  {
    who: null,
    pages: [
      '/',
      '/age',
      '/join',
      '/sign-in',
      '/register',
      '/forgot',
      '/reset',
      '/verify',
      '/confirm-email',
      '/terms',
      '/privacy',
      '/demo/letters',
      '/nowhere',
      '/books/slack-water',
      '/books/slack-water/raspberry-dulse-cordial',
      '/books/slack-water/whitecap-sour',
    ],
  },
  { who: 'member@demo.example', pages: ['/account'] },
  {
    who: 'editor@demo.example',
    pages: [
      '/workroom/shoots',
      '/workroom/shoots/:shoot',
      '/workroom/recipes',
      '/workroom/recipes/:recipe',
      '/workroom/plates',
      '/workroom/bindery',
      '/workroom/bindery/:book',
      '/workroom/bindery/:book/galley',
      '/workroom/bindery/:book/galley/whitecap-sour',
      '/workroom/larder',
    ],
  },
  { who: 'admin@demo.example', pages: ['/office/people', '/office/tiers', '/office/imprint'] },
];

async function enter(page: Page, who: string | null): Promise<(path: string) => string> {
  const headers = { origin: process.env.E2E_URL! };
  await page.request.post('/api/session/age', { data: { oldEnough: true }, headers });
  if (!who) return (path) => path;
  await signIn(page, who);
  if (!who.startsWith('editor')) return (path) => path;
  const first = async (path: string, list: string) =>
    ((await (await page.request.get(path)).json()) as Record<string, { id: string }[]>)[list]![0]!.id;
  const ids = {
    ':shoot': await first('/api/shoots', 'shoots'),
    ':recipe': await first('/api/recipes', 'recipes'),
    ':book': await first('/api/bindery/books', 'books'),
  };
  return (path) => Object.entries(ids).reduce((made, [name, id]) => made.replace(name, id), path);
}

async function open(page: Page, path: string): Promise<void> {
  await page.goto(path);
  await expect(page.getByRole('heading', { level: 1 })).toHaveCount(1);
  await expect(page.locator('.app-skeleton')).toHaveCount(0);
  // What arrives later would stand between the controls that are counted.
  await page.waitForLoadState('networkidle');
}

/** What axe finds serious or critical, in either theme. */
async function graveFindings(page: Page): Promise<string[]> {
  const found: string[] = [];
  // A colour that is still on its way would be measured as it is in passing.
  await page.emulateMedia({ reducedMotion: 'reduce' });
  for (const theme of ['paper', 'cellar']) {
    await page.evaluate((chosen) => {
      document.documentElement.dataset.theme = chosen;
      for (const animation of document.getAnimations()) animation.finish();
    }, theme);
    const { violations } = await new AxeBuilder({ page }).analyze();
    for (const { id, impact, nodes } of violations)
      if (impact === 'serious' || impact === 'critical')
        found.push(`${theme}: ${id} ${nodes.map(({ target }) => target.join(' ')).join(', ')}`);
  }
  await page.emulateMedia({ reducedMotion: null });
  return found;
}

/**
 * What Tab has to reach, numbered in reading order; of a group of radio buttons one stop is enough. A region that scrolls is
 * a stop of its own.
 */
async function numberControls(page: Page): Promise<number> {
  return page.evaluate(() => {
    const groups = new Set<string>();
    const controls = [
      ...document.querySelectorAll<HTMLElement>('a[href], button, input, select, textarea, summary, [tabindex="0"]'),
    ].filter((element) => {
      if (
        !element.checkVisibility({ visibilityProperty: true }) ||
        element.matches(':disabled, [tabindex="-1"], [inert] *')
      )
        return false;
      if (!(element instanceof HTMLInputElement) || element.type !== 'radio') return true;
      if (groups.has(element.name)) return false;
      groups.add(element.name);
      return true;
    });
    controls.forEach((element, index) => (element.dataset.stop = String(index)));
    return controls.length;
  });
}

interface Stop {
  stop: number;
  /** Whether the focus can be seen. */
  seen: boolean;
  element: string;
}

/** From now on the page writes down where the focus goes. */
async function watchFocus(page: Page): Promise<void> {
  await page.evaluate(() => {
    const stops: Stop[] = [];
    (window as unknown as { stops: Stop[] }).stops = stops;
    document.addEventListener('focusin', ({ target: active }) => {
      if (!(active instanceof HTMLElement) || active === document.body) return;
      let marked: HTMLElement | null = active;
      let seen = false;
      for (let up = 0; marked && up < 5 && !seen; up += 1, marked = marked.parentElement) {
        const { outlineStyle, outlineWidth, borderTopWidth, boxShadow } = getComputedStyle(marked);
        seen =
          (outlineStyle !== 'none' && parseFloat(outlineWidth) > 0) ||
          (up > 0 && (parseFloat(borderTopWidth) >= 2 || boxShadow !== 'none'));
      }
      const radio =
        active instanceof HTMLInputElement && active.type === 'radio'
          ? document.querySelector<HTMLElement>(`input[name="${active.name}"][data-stop]`)
          : active;
      stops.push({ stop: Number(radio?.dataset.stop ?? -1), seen, element: active.outerHTML.slice(0, 160) });
    });
  });
}

/** Walks the page by Tab; once more where something arrived on the way and so stood between what had been counted. */
async function walkByTab(page: Page): Promise<string[]> {
  const wrong = await walkOnce(page);
  return wrong.length === 0 ? wrong : walkOnce(page);
}

/** Walks the page by Tab from its beginning; what is wrong with the way. */
async function walkOnce(page: Page): Promise<string[]> {
  const count = await numberControls(page);
  await page.evaluate(() => {
    // Tab goes on from where the focus was last, even when that has lost it.
    document.body.tabIndex = -1;
    document.body.focus();
    document.body.removeAttribute('tabindex');
  });
  await watchFocus(page);
  for (let press = 0; press < count; press += 1) await page.keyboard.press('Tab');
  const met = await page.evaluate(() => (window as unknown as { stops: Stop[] }).stops);
  const wrong = met.filter(({ seen }) => !seen).map(({ element }) => `the focus cannot be seen on ${element}`);
  // Several keys may be needed within one control, a date for example.
  const stops = met.map(({ stop }) => stop).filter((stop, index, all) => stop >= 0 && stop !== all[index - 1]);
  if (stops.some((stop, index) => index > 0 && stop < stops[index - 1]!)) wrong.push(`not in reading order: ${stops}`);
  if (stops.length < count) wrong.push(`Tab reaches ${stops.length} of ${count} controls`);
  return wrong;
}

/** How much wider than a window of 320 px the page is. */
async function overhang(page: Page): Promise<number> {
  const { width, height } = page.viewportSize()!;
  await page.setViewportSize({ width: 320, height: 720 });
  const wide = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
  await page.setViewportSize({ width, height });
  return Math.max(0, wide);
}

const titles = new Map<string, string>();

for (const { who, pages } of WALKS)
  test(`every page of ${who ?? 'a visitor'}: axe, title, Tab, 320 px`, async ({ page }) => {
    test.setTimeout(180_000);
    const addressOf = await enter(page, who);
    for (const path of pages) {
      await open(page, addressOf(path));
      const title = await page.title();
      expect.soft(titles.get(title), `“${title}” names ${path} and another page`).toBeUndefined();
      titles.set(title, path);
      expect.soft(await walkByTab(page), path).toEqual([]);
      expect.soft(await graveFindings(page), path).toEqual([]);
      expect.soft(await overhang(page), `${path} is too wide`).toBe(0);
    }
  });
