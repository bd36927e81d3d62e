import { z } from 'zod';
import { id, slug } from '../../shared/contracts/primitives.ts';
import { bookContents, readingQuery, readingView, shelf } from '../../shared/contracts/reading.ts';
import { defineRoute, type Route } from '../http/registry.ts';
import { renditionName } from '../plates/rendition-address.ts';
import { readEpub } from './download.service.ts';
import { readGalley, readGalleyRecipe } from './galley.service.ts';
import { toGateViewer } from './gate-viewer.ts';
import { readCover, readPlate } from './plates.service.ts';
import { readContents, readRecipe, readShelf } from './reading.service.ts';

export const readingRoutes: Route[] = [
  defineRoute({
    id: 'readShelf',
    method: 'get',
    path: '/api/shelf',
    access: 'anyone',
    summary: 'The issued books of the house.',
    answer: shelf,
    handler: ({ ctx }) => readShelf(ctx),
  }),
  defineRoute({
    id: 'readCover',
    method: 'get',
    path: '/api/reading/:book/cover/:plate/:rendition',
    access: 'anyone',
    summary: 'The cover of an issued book.',
    params: z.object({ book: slug, plate: id, rendition: renditionName }),
    answer: 'file',
    handler: ({ ctx, params }) => readCover(ctx, params),
  }),
  defineRoute({
    id: 'readContents',
    method: 'get',
    path: '/api/reading/:book',
    access: 'reader',
    summary: 'The contents of an issued book as this reader sees them.',
    params: z.object({ book: slug }),
    query: readingQuery,
    answer: bookContents,
    handler: ({ ctx, viewer, params, query }) => readContents(ctx, params.book, toGateViewer(viewer, query.as)),
  }),
  defineRoute({
    id: 'readBookRecipe',
    method: 'get',
    path: '/api/reading/:book/:recipe',
    access: 'reader',
    summary: 'A recipe: whole, or closed behind its teaser.',
    params: z.object({ book: slug, recipe: slug }),
    query: readingQuery,
    answer: readingView,
    handler: ({ ctx, viewer, params, query }) =>
      readRecipe(ctx, { book: params.book, slug: params.recipe }, toGateViewer(viewer, query.as)),
  }),
  defineRoute({
    id: 'readBookPlate',
    method: 'get',
    path: '/api/reading/:book/:recipe/plates/:plate/:rendition',
    access: 'reader',
    summary: 'A plate of a recipe, as large as the gate allows.',
    params: z.object({ book: slug, recipe: slug, plate: id, rendition: renditionName }),
    query: readingQuery,
    answer: 'file',
    handler: ({ ctx, viewer, params, query }) => readPlate(ctx, params, toGateViewer(viewer, query.as)),
  }),
  defineRoute({
    id: 'downloadEpub',
    method: 'get',
    path: '/api/reading/:book/files/epub',
    access: 'reader',
    summary: 'The book as EPUB, for whom all of it is open.',
    params: z.object({ book: slug }),
    answer: 'file',
    handler: ({ ctx, viewer, params }) => readEpub(ctx, params.book, toGateViewer(viewer, undefined)),
  }),
  defineRoute({
    id: 'readGalley',
    method: 'get',
    path: '/api/bindery/books/:id/galley',
    access: 'staff',
    summary: 'The galley of a book, as any tier would see it.',
    params: z.object({ id }),
    query: readingQuery,
    answer: bookContents,
    handler: ({ ctx, viewer, params, query }) => readGalley(ctx, params.id, toGateViewer(viewer, query.as)),
  }),
  defineRoute({
    id: 'readGalleyRecipe',
    method: 'get',
    path: '/api/bindery/books/:id/galley/:recipe',
    access: 'staff',
    summary: 'A recipe of the galley, as any tier would see it.',
    params: z.object({ id, recipe: slug }),
    query: readingQuery,
    answer: readingView,
    handler: ({ ctx, viewer, params, query }) =>
      readGalleyRecipe(ctx, { bookId: params.id, slug: params.recipe }, toGateViewer(viewer, query.as)),
  }),
];
