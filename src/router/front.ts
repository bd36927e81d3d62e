import type { RouteRecordRaw } from 'vue-router';

/** What a visitor meets: the front door, joining, signing in, the legal notes. */
export const frontRoutes: RouteRecordRaw[] = [
  {
    path: '/',
    component: () => import('@/layouts/ReadingLayout.vue'),
    children: [
      {
        path: '',
        name: 'front-door',
        component: () => import('@/pages/front/FrontDoorPage.vue'),
        meta: { title: 'front.title.door' },
      },
      {
        path: 'join',
        name: 'join',
        component: () => import('@/pages/front/JoinPage.vue'),
        meta: { title: 'front.title.join' },
      },
      {
        path: 'join/return',
        name: 'join-return',
        component: () => import('@/pages/front/JoinReturnPage.vue'),
        meta: { title: 'front.title.joinReturn', access: 'signed-in' },
      },
      {
        path: 'age',
        name: 'age',
        component: () => import('@/pages/front/AgePage.vue'),
        meta: { title: 'front.title.age' },
      },
      {
        path: 'sign-in',
        name: 'sign-in',
        component: () => import('@/pages/front/SignInPage.vue'),
        meta: { title: 'front.title.signIn' },
      },
      {
        path: 'register',
        name: 'register',
        component: () => import('@/pages/front/RegisterPage.vue'),
        meta: { title: 'front.title.register' },
      },
      {
        path: 'verify',
        name: 'verify',
        component: () => import('@/pages/front/VerifyPage.vue'),
        meta: { title: 'front.title.verify' },
      },
      {
        path: 'forgot',
        name: 'forgot',
        component: () => import('@/pages/front/ForgotPage.vue'),
        meta: { title: 'front.title.forgot' },
      },
      {
        path: 'reset',
        name: 'reset',
        component: () => import('@/pages/front/ResetPage.vue'),
        meta: { title: 'front.title.reset' },
      },
      {
        path: 'confirm-email',
        name: 'confirm-email',
        component: () => import('@/pages/front/ConfirmEmailPage.vue'),
        meta: { title: 'front.title.confirmEmail' },
      },
      {
        path: 'terms',
        name: 'terms',
        component: () => import('@/pages/front/TermsPage.vue'),
        meta: { title: 'front.title.terms' },
      },
      {
        path: 'privacy',
        name: 'privacy',
        component: () => import('@/pages/front/PrivacyPage.vue'),
        meta: { title: 'front.title.privacy' },
      },
      {
        path: 'demo/letters',
        name: 'demo-letters',
        component: () => import('@/pages/front/DemoLettersPage.vue'),
        meta: { title: 'front.title.demoLetters' },
      },
      {
        path: ':path(.*)*',
        name: 'not-found',
        component: () => import('@/pages/front/NotFoundPage.vue'),
        meta: { title: 'front.title.notFound' },
      },
    ],
  },
];
