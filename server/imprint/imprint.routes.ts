import { imprintDraft, imprintPublic, imprintSettings } from '../../shared/contracts/imprint.ts';
import { defineRoute, type Route } from '../http/registry.ts';
import { saveSettings, viewImprint, viewSettings } from './imprint.service.ts';

export const imprintRoutes: Route[] = [
  defineRoute({
    id: 'readImprint',
    method: 'get',
    path: '/api/imprint',
    access: 'anyone',
    summary: 'Name, currency, zone, age limit, terms and privacy of the house.',
    answer: imprintPublic,
    handler: ({ ctx }) => viewImprint(ctx.db),
  }),
  defineRoute({
    id: 'readImprintSettings',
    method: 'get',
    path: '/api/office/imprint',
    access: 'admin',
    summary: 'The settings of the house, to be changed.',
    answer: imprintSettings,
    versioned: 'answer',
    handler: ({ ctx }) => viewSettings(ctx.db),
  }),
  defineRoute({
    id: 'saveImprintSettings',
    method: 'put',
    path: '/api/office/imprint',
    access: 'admin',
    summary: 'Saves the settings of the house.',
    body: imprintDraft,
    answer: imprintSettings,
    versioned: 'required',
    handler: ({ ctx, body, expected }) => saveSettings(ctx.db, body, expected),
  }),
];
