import { z } from 'zod';
import { id } from '../../shared/contracts/primitives.ts';
import { notesPaste, shootDraft, shootList, shootReading, shootView } from '../../shared/contracts/shoots.ts';
import { requestInvalid } from '../http/http.errors.ts';
import { defineRoute, type Route } from '../http/registry.ts';
import { keepNotes, readDraft } from './notes.service.ts';
import { listShoots, makeShoot, readShoot, saveShoot } from './shoots.service.ts';
import { fileNameOf, takeNotes } from './upload.ts';

const byId = z.object({ id });
/** Ten million characters and what JSON adds to them. */
const PASTE_LIMIT = 16 * 1024 * 1024;

export const shootRoutes: Route[] = [
  defineRoute({
    id: 'listShoots',
    method: 'get',
    path: '/api/shoots',
    access: 'staff',
    summary: 'The shoots, the last filmed first.',
    answer: shootList,
    handler: async ({ ctx }) => ({ shoots: await listShoots(ctx.db) }),
  }),
  defineRoute({
    id: 'makeShoot',
    method: 'post',
    path: '/api/shoots',
    access: 'staff',
    summary: 'Begins a shoot: its title, its day, the address of its video.',
    body: shootDraft,
    answer: shootView,
    status: 201,
    versioned: 'answer',
    handler: ({ ctx, viewer, body }) => makeShoot(ctx.db, body, viewer.person!.id),
  }),
  defineRoute({
    id: 'readShoot',
    method: 'get',
    path: '/api/shoots/:id',
    access: 'staff',
    summary: 'A shoot with its notes as cues and the recipes begun from it.',
    params: byId,
    answer: shootView,
    versioned: 'answer',
    handler: ({ ctx, params }) => readShoot(ctx.db, params.id),
  }),
  defineRoute({
    id: 'saveShoot',
    method: 'put',
    path: '/api/shoots/:id',
    access: 'staff',
    summary: 'Saves title, day and video address.',
    params: byId,
    body: shootDraft,
    answer: shootView,
    versioned: 'required',
    handler: ({ ctx, params, body, expected }) => saveShoot(ctx.db, params.id, body, expected),
  }),
  defineRoute({
    id: 'uploadNotes',
    method: 'put',
    path: '/api/shoots/:id/notes',
    access: 'staff',
    summary: 'Replaces the notes by a file (field `notes`): WebVTT, SubRip or text. Refused ones leave the old notes.',
    params: byId,
    upload: takeNotes,
    answer: shootView,
    versioned: 'required',
    handler: ({ ctx, params, files: [file], expected }) => {
      if (!file) throw requestInvalid({ faults: [{ path: 'notes', message: 'Choose a file of notes.' }] });
      return keepNotes(ctx, { id: params.id, expected, notes: { name: fileNameOf(file), bytes: file.buffer } });
    },
  }),
  defineRoute({
    id: 'pasteNotes',
    method: 'put',
    path: '/api/shoots/:id/notes/text',
    access: 'staff',
    summary: 'Replaces the notes by pasted text.',
    params: byId,
    body: notesPaste,
    bodyLimit: PASTE_LIMIT,
    answer: shootView,
    versioned: 'required',
    handler: ({ ctx, params, body, expected }) =>
      keepNotes(ctx, { id: params.id, expected, notes: { name: '', bytes: new TextEncoder().encode(body.text) } }),
  }),
  defineRoute({
    id: 'readDraft',
    method: 'get',
    path: '/api/shoots/:id/draft',
    access: 'staff',
    summary:
      'What the reader makes of the notes: the draft with its cues and gaps, and the recipe that it would begin.',
    params: byId,
    answer: shootReading,
    handler: ({ ctx, params }) => readDraft(ctx, params.id),
  }),
];
