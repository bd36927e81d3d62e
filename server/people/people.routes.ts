import { z } from 'zod';
import {
  emailChange,
  emailOnly,
  nameChange,
  passwordChange,
  passwordReset,
  personList,
  personQuery,
  personRow,
  registration,
  rolesChange,
  tokenOnly,
} from '../../shared/contracts/people.ts';
import { DONE, done, id } from '../../shared/contracts/primitives.ts';
import { sessionView } from '../../shared/contracts/session.ts';
import { countFailure, refuseWhenLimited, spend } from '../http/failure-limits.ts';
import { defineRoute, type Route } from '../http/registry.ts';
import { viewerOf } from '../http/viewer.ts';
import {
  changeName,
  changePassword,
  confirmEmailChange,
  forgotPassword,
  register,
  resendVerification,
  resetPassword,
  startEmailChange,
  verifyEmail,
} from './people.service.ts';
import { reloadViewer } from './load-viewer.ts';
import { viewSession } from './session.service.ts';
import { openSessionFor } from './sign-in.ts';
import { changeRoles, listPeople } from './team.service.ts';

export const peopleRoutes: Route[] = [
  defineRoute({
    id: 'register',
    method: 'post',
    path: '/api/people/register',
    access: 'anyone',
    summary: 'Makes an account, signs it in and sends the letter that confirms its address.',
    body: registration,
    answer: sessionView,
    status: 201,
    handler: async ({ ctx, viewer, body, request }) => {
      await spend(ctx.db, 'letter-from-place', request.ip ?? 'unknown');
      const person = await register(ctx, body, viewer.ageConfirmed);
      await openSessionFor(request, { id: person.id });
      await reloadViewer(ctx, request);
      return viewSession(ctx, viewerOf(request));
    },
  }),
  defineRoute({
    id: 'verifyEmail',
    method: 'post',
    path: '/api/people/verify',
    access: 'anyone',
    summary: 'Confirms an e-mail address by the link of a letter.',
    body: tokenOnly,
    answer: done,
    handler: async ({ ctx, body, request }) => {
      await triesToken(ctx.db, request.ip, () => verifyEmail(ctx, body.token));
      return DONE;
    },
  }),
  defineRoute({
    id: 'resendVerification',
    method: 'post',
    path: '/api/people/verify/resend',
    access: 'account',
    summary: 'Sends the confirming letter once more.',
    answer: done,
    handler: async ({ ctx, viewer }) => {
      await spend(ctx.db, 'letter-to', viewer.person!.email);
      await resendVerification(ctx, viewer.person!.id);
      return DONE;
    },
  }),
  defineRoute({
    id: 'forgotPassword',
    method: 'post',
    path: '/api/people/forgot',
    access: 'anyone',
    summary: 'Sends a link to a new password if there is such an account; the answer never tells.',
    body: emailOnly,
    answer: done,
    handler: async ({ ctx, body, request }) => {
      await spend(ctx.db, 'letter-to', body.email);
      await spend(ctx.db, 'letter-from-place', request.ip ?? 'unknown');
      await forgotPassword(ctx, body.email);
      return DONE;
    },
  }),
  defineRoute({
    id: 'resetPassword',
    method: 'post',
    path: '/api/people/reset',
    access: 'anyone',
    summary: 'Sets a new password by the link of a letter and ends every session.',
    body: passwordReset,
    answer: done,
    handler: async ({ ctx, body, request }) => {
      await triesToken(ctx.db, request.ip, () => resetPassword(ctx, body.token, body.password));
      return DONE;
    },
  }),
  defineRoute({
    id: 'changePassword',
    method: 'put',
    path: '/api/account/password',
    access: 'account',
    summary: 'Changes the password; every other session of the account ends.',
    body: passwordChange,
    answer: done,
    handler: async ({ ctx, viewer, body, request }) => {
      const personId = viewer.person!.id;
      await triesToken(ctx.db, personId, () => changePassword(ctx, { ...body, personId, sid: request.sessionID }));
      return DONE;
    },
  }),
  defineRoute({
    id: 'changeName',
    method: 'put',
    path: '/api/account/name',
    access: 'account',
    summary: 'Changes the name that the house uses.',
    body: nameChange,
    answer: done,
    handler: async ({ ctx, viewer, body }) => {
      await changeName(ctx, viewer.person!.id, body.name);
      return DONE;
    },
  }),
  defineRoute({
    id: 'startEmailChange',
    method: 'post',
    path: '/api/account/email',
    access: 'account',
    summary: 'Asks a new address to confirm itself and tells the old one.',
    body: emailChange,
    answer: done,
    handler: async ({ ctx, viewer, body }) => {
      const personId = viewer.person!.id;
      await spend(ctx.db, 'letter-to', body.email);
      await triesToken(ctx.db, personId, () => startEmailChange(ctx, { ...body, personId }));
      return DONE;
    },
  }),
  defineRoute({
    id: 'confirmEmailChange',
    method: 'post',
    path: '/api/people/confirm-email',
    access: 'anyone',
    summary: 'Changes the address by the link of a letter; both addresses are told.',
    body: tokenOnly,
    answer: done,
    handler: async ({ ctx, body, request }) => {
      await triesToken(ctx.db, request.ip, () => confirmEmailChange(ctx, body.token));
      return DONE;
    },
  }),
  defineRoute({
    id: 'listPeople',
    method: 'get',
    path: '/api/office/people',
    access: 'admin',
    summary: 'The people of the house, newest first.',
    query: personQuery,
    answer: personList,
    handler: ({ ctx, query }) => listPeople(ctx.db, query),
  }),
  defineRoute({
    id: 'changeRoles',
    method: 'put',
    path: '/api/office/people/:id/roles',
    access: 'admin',
    summary: 'Gives and takes roles.',
    params: z.object({ id }),
    body: rolesChange,
    answer: personRow,
    versioned: 'required',
    handler: ({ ctx, params, body, expected }) =>
      changeRoles(ctx, { personId: params.id, roles: body.roles, expected }),
  }),
];

/** Runs an action that a secret opens; wrong secrets from one place are counted and at last refused. */
async function triesToken(
  db: Parameters<typeof countFailure>[0],
  from: string | undefined,
  action: () => Promise<void>,
): Promise<void> {
  const key = from ?? 'unknown';
  await refuseWhenLimited(db, 'token', key);
  try {
    await action();
  } catch (error) {
    await countFailure(db, 'token', key);
    throw error;
  }
}
