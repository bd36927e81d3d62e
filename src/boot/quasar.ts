import { Quasar } from 'quasar';
import lang from 'quasar/lang/en-GB.js';
import type { App } from 'vue';
import { iconSet } from './icon-set.ts';

export function installQuasar(app: App): void {
  app.use(Quasar, { lang, iconSet, config: { ripple: false } });
}
