import type { App } from 'vue';
import { createI18n } from 'vue-i18n';
import { areas, en, type Area } from '@/locales/en/index.ts';

const LOCALE = 'en-GB';

export const i18n = createI18n({
  legacy: false,
  locale: LOCALE,
  fallbackLocale: LOCALE,
  messages: { [LOCALE]: en },
});

const loaded = new Set<Area>();

/** Adds an area's catalogue to the messages, the first time it is entered. */
export async function loadArea(area: Area): Promise<void> {
  if (loaded.has(area)) return;
  i18n.global.mergeLocaleMessage(LOCALE, { [area]: await areas[area]() });
  loaded.add(area);
}

export function installI18n(app: App): void {
  app.use(i18n);
}
