import type { App } from 'vue';
import { createI18n } from 'vue-i18n';
import { en } from '@/locales/en/index.ts';

export const i18n = createI18n({
  legacy: false,
  locale: 'en-GB',
  fallbackLocale: 'en-GB',
  messages: { 'en-GB': en },
});

export function installI18n(app: App): void {
  app.use(i18n);
}
