import type { RouteRecordRaw } from 'vue-router';

/** The staff area: from the shoot's notes to the pressed book. */
export const workroomRoutes: RouteRecordRaw[] = [
  {
    path: '/workroom',
    component: () => import('@/layouts/WorkroomLayout.vue'),
    meta: { access: 'staff', area: 'workroom' },
    children: [
      { path: '', redirect: { name: 'shoots' } },
      {
        path: 'shoots',
        name: 'shoots',
        component: () => import('@/pages/workroom/ShootsPage.vue'),
        meta: { title: 'workroom.title.shoots' },
      },
      {
        path: 'shoots/:id',
        name: 'shoot',
        component: () => import('@/pages/workroom/ShootPage.vue'),
        props: true,
        meta: { title: 'workroom.title.shoot' },
      },
      {
        path: 'recipes',
        name: 'recipes',
        component: () => import('@/pages/workroom/RecipesPage.vue'),
        meta: { title: 'workroom.title.recipes' },
      },
      {
        path: 'recipes/:id',
        name: 'recipe',
        component: () => import('@/pages/workroom/RecipeEditorPage.vue'),
        props: true,
        meta: { title: 'workroom.title.recipe' },
      },
      {
        path: 'plates',
        name: 'plates',
        component: () => import('@/pages/workroom/PlatesPage.vue'),
        meta: { title: 'workroom.title.plates' },
      },
      {
        path: 'bindery',
        name: 'bindery',
        component: () => import('@/pages/workroom/BinderyPage.vue'),
        meta: { title: 'workroom.title.bindery' },
      },
      {
        path: 'bindery/:id',
        name: 'binding',
        component: () => import('@/pages/workroom/BindingPage.vue'),
        props: true,
        meta: { title: 'workroom.title.binding' },
      },
      {
        path: 'larder',
        name: 'larder',
        component: () => import('@/pages/workroom/LarderPage.vue'),
        meta: { title: 'workroom.title.larder' },
      },
    ],
  },
  {
    // A galley is read where the book will be read, by those who make it.
    path: '/workroom/bindery/:id/galley',
    component: () => import('@/layouts/ReadingLayout.vue'),
    meta: { access: 'staff', area: 'workroom' },
    children: [
      {
        path: '',
        name: 'galley',
        component: () => import('@/pages/workroom/GalleyPage.vue'),
        props: true,
        meta: { title: 'workroom.title.galley' },
      },
      {
        path: ':recipe',
        name: 'galley-recipe',
        component: () => import('@/pages/workroom/GalleyRecipePage.vue'),
        props: true,
        meta: { title: 'workroom.title.galleyRecipe' },
      },
    ],
  },
];
