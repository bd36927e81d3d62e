import type { RouteRecordRaw } from 'vue-router';

/** The reading room: books, recipes, the member's own account. */
export const readingRoutes: RouteRecordRaw[] = [
  {
    path: '/',
    component: () => import('@/layouts/ReadingLayout.vue'),
    children: [
      {
        path: 'books/:book',
        name: 'book',
        component: () => import('@/pages/reading/BookPage.vue'),
        props: true,
        meta: { title: 'reading.title.book', age: true },
      },
      {
        path: 'books/:book/:recipe',
        name: 'read-recipe',
        component: () => import('@/pages/reading/RecipePage.vue'),
        props: true,
        meta: { title: 'reading.title.recipe', age: true },
      },
      {
        path: 'account',
        name: 'account',
        component: () => import('@/pages/reading/AccountPage.vue'),
        meta: { title: 'reading.title.account', access: 'signed-in' },
      },
    ],
  },
];
