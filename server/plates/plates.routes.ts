import { z } from 'zod';
import { plateList, plateUpload, plateView, plateWords } from '../../shared/contracts/plates.ts';
import { DONE, done, id } from '../../shared/contracts/primitives.ts';
import { defineRoute, type Route } from '../http/registry.ts';
import { keepPlates, listPlates, readPlate, readRendition, removePlate, savePlateWords } from './plates.service.ts';
import { renditionName } from './rendition-address.ts';
import { takePlates } from './upload.ts';

const byId = z.object({ id });
const ofShoot = z.strictObject({ shoot: id.optional() });

export const plateRoutes: Route[] = [
  defineRoute({
    id: 'listPlates',
    method: 'get',
    path: '/api/plates',
    access: 'staff',
    summary: 'The plates of the house, newest first, or those of one shoot.',
    query: ofShoot,
    answer: plateList,
    handler: async ({ ctx, query }) => ({ plates: await listPlates(ctx.db, query.shoot) }),
  }),
  defineRoute({
    id: 'keepPlates',
    method: 'post',
    path: '/api/plates',
    access: 'staff',
    summary: 'Takes a batch of pictures (field `plates`); each is kept or refused by name.',
    query: ofShoot,
    upload: takePlates,
    answer: plateUpload,
    status: 201,
    handler: ({ ctx, viewer, files, query }) =>
      keepPlates(ctx, { files, personId: viewer.person!.id, shootId: query.shoot ?? null }),
  }),
  defineRoute({
    id: 'readPlate',
    method: 'get',
    path: '/api/plates/:id',
    access: 'staff',
    summary: 'A plate with its words and sizes.',
    params: byId,
    answer: plateView,
    versioned: 'answer',
    handler: ({ ctx, params }) => readPlate(ctx.db, params.id),
  }),
  defineRoute({
    id: 'savePlateWords',
    method: 'put',
    path: '/api/plates/:id',
    access: 'staff',
    summary: 'Saves alt text, caption and credit.',
    params: byId,
    body: plateWords,
    answer: plateView,
    versioned: 'required',
    handler: ({ ctx, params, body, expected }) => savePlateWords(ctx.db, params.id, body, expected),
  }),
  defineRoute({
    id: 'removePlate',
    method: 'delete',
    path: '/api/plates/:id',
    access: 'staff',
    summary: 'Takes away a plate that nothing shows.',
    params: byId,
    answer: done,
    handler: async ({ ctx, params }) => {
      await removePlate(ctx.db, params.id);
      return DONE;
    },
  }),
  defineRoute({
    id: 'readRendition',
    method: 'get',
    path: '/api/plates/:id/:rendition',
    access: 'staff',
    summary: 'One size of a plate, for staff.',
    params: z.object({ id, rendition: renditionName }),
    answer: 'file',
    handler: ({ ctx, params }) => readRendition(ctx, params.id, params.rendition),
  }),
];
