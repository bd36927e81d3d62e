import { nextTick } from 'vue';
import { createRouter, createWebHistory } from 'vue-router';
import { i18n, loadArea } from '@/boot/i18n.ts';
import { setRouteTitle } from '@/composables/useTitle.ts';
import { focusHeading } from './focus.ts';
import { guardAccess } from './guards.ts';
import { routes } from './routes.ts';

export const router = createRouter({
  history: createWebHistory(),
  routes,
  scrollBehavior(to, from, saved) {
    if (saved) return saved;
    if (to.hash) return { el: to.hash, top: 80 };
    return to.path === from.path ? false : { top: 0 };
  },
});

router.beforeEach(guardAccess);
router.beforeEach(async (to) => {
  if (to.meta.area) await loadArea(to.meta.area);
});

router.afterEach((to, from, failure) => {
  if (failure) return;
  setRouteTitle(to.meta.title ? i18n.global.t(to.meta.title) : '');
  // The first page leaves the focus where a browser puts it, before the link that skips to the text.
  const first = from.matched.length === 0;
  if (!first && to.path !== from.path && !to.hash) void nextTick(focusHeading);
});
