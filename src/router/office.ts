import type { RouteRecordRaw } from 'vue-router';

/** The admin's area. */
export const officeRoutes: RouteRecordRaw[] = [
  {
    path: '/office',
    component: () => import('@/layouts/OfficeLayout.vue'),
    meta: { access: ['admin'], area: 'office' },
    children: [
      { path: '', redirect: { name: 'people' } },
      {
        path: 'people',
        name: 'people',
        component: () => import('@/pages/office/PeoplePage.vue'),
        meta: { title: 'office.title.people' },
      },
      {
        path: 'tiers',
        name: 'tiers',
        component: () => import('@/pages/office/TiersPage.vue'),
        meta: { title: 'office.title.tiers' },
      },
      {
        path: 'imprint',
        name: 'imprint',
        component: () => import('@/pages/office/ImprintPage.vue'),
        meta: { title: 'office.title.imprint' },
      },
    ],
  },
];
