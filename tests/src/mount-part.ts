import { PiniaColada } from '@pinia/colada';
import { mount } from '@vue/test-utils';
import { createPinia } from 'pinia';
import { Quasar } from 'quasar';
import type { Plugin } from 'vue';
import { createMemoryHistory, createRouter } from 'vue-router';
import { i18n } from '@/boot/i18n.ts';

/** The global parts every component may count on, with a router that knows only the front door and signing in. */
export function globalParts(): { plugins: (Plugin | [Plugin, ...unknown[]])[] } {
  const page = { template: '<div />' };
  const router = createRouter({
    history: createMemoryHistory(),
    routes: [
      { path: '/', name: 'front-door', component: page },
      { path: '/sign-in', name: 'sign-in', component: page },
    ],
  });
  return { plugins: [i18n, createPinia(), PiniaColada, [Quasar, {}], router] };
}

export { mount };
