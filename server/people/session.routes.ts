import { DONE, done } from '../../shared/contracts/primitives.ts';
import { ageAnswer, credentials, demoAccounts, sessionView } from '../../shared/contracts/session.ts';
import { DEMO_ACCOUNTS, DEMO_PASSWORD } from '../demo/accounts.ts';
import { requestNotFound } from '../http/http.errors.ts';
import { defineRoute, type Route } from '../http/registry.ts';
import { viewerOf } from '../http/viewer.ts';
import { confirmAge, signIn, viewSession } from './session.service.ts';
import { reloadViewer } from './load-viewer.ts';
import { closeSession } from './sign-in.ts';

export const sessionRoutes: Route[] = [
  defineRoute({
    id: 'readSession',
    method: 'get',
    path: '/api/session',
    access: 'anyone',
    summary: 'Who is signed in, and what the page frame needs to know.',
    answer: sessionView,
    handler: ({ ctx, viewer }) => viewSession(ctx, viewer),
  }),
  defineRoute({
    id: 'signIn',
    method: 'post',
    path: '/api/session',
    access: 'anyone',
    summary: 'Signs in with e-mail and password.',
    body: credentials,
    answer: sessionView,
    handler: async ({ ctx, body, request }) => {
      await signIn(ctx, request, body.email);
      await reloadViewer(ctx, request);
      return viewSession(ctx, viewerOf(request));
    },
  }),
  defineRoute({
    id: 'signOut',
    method: 'delete',
    path: '/api/session',
    access: 'anyone',
    summary: 'Signs out; the session is gone everywhere.',
    answer: done,
    handler: async ({ request }) => {
      await closeSession(request);
      return DONE;
    },
  }),
  defineRoute({
    id: 'confirmAge',
    method: 'post',
    path: '/api/session/age',
    access: 'anyone',
    summary: 'Says that the reader has reached the age limit.',
    body: ageAnswer,
    answer: done,
    handler: async ({ ctx, viewer, request }) => {
      await confirmAge(ctx, viewer, request);
      return DONE;
    },
  }),
  defineRoute({
    id: 'listDemoAccounts',
    method: 'get',
    path: '/api/demo/accounts',
    access: 'anyone',
    summary: 'The accounts of the demonstration; not found outside it.',
    answer: demoAccounts,
    handler: async ({ ctx }) => {
      if (ctx.settings.mode !== 'demo') throw requestNotFound();
      return { password: DEMO_PASSWORD, accounts: DEMO_ACCOUNTS.map(({ email, part }) => ({ email, part })) };
    },
  }),
];
