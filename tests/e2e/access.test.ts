import AxeBuilder from '@axe-core/playwright';
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
  await page.waitForLoadState('networkidle');
}

for (const theme of ['paper', 'cellar']) {
  test(`axe finds nothing serious on any page in the ${theme} theme, and every title is its own`, async ({ page }) => {
    test.setTimeout(240_000);
    await page.addInitScript((chosen) => localStorage.setItem('theme', chosen), theme);
    const titles = new Map<string, string>();
    for (const { who, pages } of WALKS) {
      const addressOf = await enter(page, who);
      for (const path of pages) {
        await open(page, addressOf(path));
        expect(await page.locator('html').getAttribute('data-theme')).toBe(theme);
        const { violations } = await new AxeBuilder({ page }).analyze();
        const grave = violations.filter(({ impact }) => impact === 'serious' || impact === 'critical');
        expect(
          grave.map(({ id, nodes }) => `${path}: ${id} ${nodes.map(({ target }) => target.join(' ')).join(', ')}`),
        ).toEqual([]);
        const title = await page.title();
        expect(titles.get(title), `“${title}” names ${path} and another page`).toBeUndefined();
        titles.set(title, path);
      }
      await page.request.delete('/api/session', { headers: { origin: process.env.E2E_URL! } });
    }
  });
}

/** What Tab has to reach, numbered in reading order; of a group of radio buttons one stop is enough. */
async function numberControls(page: Page): Promise<number> {
  return page.evaluate(() => {
    const groups = new Set<string>();
    const controls = [
      ...document.querySelectorAll<HTMLElement>('a[href], button, input, select, textarea, summary'),
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

/** The stop that holds the focus, and whether it can be seen to. */
async function focused(page: Page): Promise<{ stop: number; seen: boolean } | null> {
  return page.evaluate(() => {
    const active = document.activeElement;
    if (!(active instanceof HTMLElement) || active === document.body) return null;
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
    return { stop: Number(radio?.dataset.stop ?? -1), seen };
  });
}

test('Tab reaches every control of every page in reading order, with its focus to be seen', async ({ page }) => {
  test.setTimeout(240_000);
  for (const { who, pages } of WALKS) {
    const addressOf = await enter(page, who);
    for (const path of pages) {
      await open(page, addressOf(path));
      const count = await numberControls(page);
      await page.evaluate(() => (document.activeElement as HTMLElement | null)?.blur());
      const stops: number[] = [];
      for (let press = 0; press < count + 2 && stops.length < count; press += 1) {
        await page.keyboard.press('Tab');
        const at = await focused(page);
        if (!at) break;
        expect(at.seen, `${path}: the focus on control ${at.stop} cannot be seen`).toBe(true);
        if (at.stop >= 0) stops.push(at.stop);
      }
      expect(stops, `${path}: not in reading order`).toEqual([...stops].sort((a, b) => a - b));
      expect(stops.length, `${path}: Tab does not reach every control`).toBe(count);
    }
    await page.request.delete('/api/session', { headers: { origin: process.env.E2E_URL! } });
  }
});

test('every page stays within 320 px without scrolling sideways', async ({ page }) => {
  test.setTimeout(240_000);
  await page.setViewportSize({ width: 320, height: 720 });
  for (const { who, pages } of WALKS) {
    const addressOf = await enter(page, who);
    for (const path of pages) {
      await open(page, addressOf(path));
      const wide = await page.evaluate(
        () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
      );
      expect(wide, `${path} is ${wide} px too wide`).toBeLessThanOrEqual(0);
    }
    await page.request.delete('/api/session', { headers: { origin: process.env.E2E_URL! } });
  }
});
