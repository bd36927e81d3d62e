import type { BookView, RunningOrder } from '../../shared/contracts/books.ts';
import { describe, expect, it } from 'vitest';
import { effectScope, shallowRef } from 'vue';
import { useRunningOrder } from '@/composables/useRunningOrder.ts';

// The rules are this product's own: a move is shown at once, saved one save at a time, and taken back where refused.
const NAMES = { hedge: ['sloe', 'haw'], shore: ['dulse'], lane: [] };

function bookOf(order: Record<string, string[]>, version = 1): BookView {
  const chapters = Object.entries(order).map(([id, recipes]) => ({
    id,
    version: 1,
    title: id,
    introduction: '',
    introductionHtml: '',
    access: null,
    recipes: recipes.map((recipeId) => ({
      recipeId,
      slug: recipeId,
      title: recipeId,
      kind: 'syrup' as const,
      state: 'cleared' as const,
      missing: [],
      access: null,
    })),
  }));
  const access = { kind: 'open' } as const;
  return { id: 'book', version, title: 'Book', subtitle: '', slug: 'book', access, coverPlateId: null, chapters };
}

function bind(refusal?: Error) {
  const held = shallowRef(bookOf(NAMES));
  const saves: { order: RunningOrder; version: number; done: () => void }[] = [];
  const order = effectScope().run(() =>
    useRunningOrder({
      book: () => held.value,
      save: (wanted, version) =>
        new Promise((resolve, reject) => {
          const laid = Object.fromEntries(wanted.chapters.map(({ id, recipes }) => [id, recipes]));
          const done = () => (refusal ? reject(refusal) : resolve((held.value = bookOf(laid, version + 1))));
          saves.push({ order: wanted, version, done });
        }),
      reload: async () => (held.value = bookOf({ shore: ['dulse'], hedge: ['sloe', 'haw'], lane: [] }, 9)),
    }),
  )!;
  const shown = () => order.chapters.value.map(({ id, recipes }) => [id, ...recipes.map((row) => row.recipeId)]);
  return { order, saves, shown };
}

const settled = () => new Promise((resolve) => setTimeout(resolve));

describe('the running order as it is being moved', () => {
  it('moves within a chapter, then over its end into the next one, and numbers through the book', async () => {
    const { order, saves, shown } = bind();
    expect(order.moveRecipe('sloe', 1)?.id).toBe('hedge');
    expect(shown()[0]).toEqual(['hedge', 'haw', 'sloe']);
    expect(order.moveRecipe('sloe', 1)?.id).toBe('shore');
    expect(shown()).toEqual([['hedge', 'haw'], ['shore', 'sloe', 'dulse'], ['lane']]);
    expect([...order.places.value]).toEqual([
      ['haw', 1],
      ['sloe', 2],
      ['dulse', 3],
    ]);

    // The second move waits for the first to be saved and goes out under the version that answered it.
    expect(saves).toHaveLength(1);
    saves[0]!.done();
    await settled();
    expect(saves.map(({ version }) => version)).toEqual([1, 2]);
    saves[1]!.done();
    await settled();
    expect(order.state.value).toBe('saved');
    expect(saves[1]!.order.chapters[1]).toEqual({ id: 'shore', recipes: ['sloe', 'dulse'] });
  });

  it('moves upwards to the end of the chapter before, also into an empty one', () => {
    const { order, shown } = bind();
    order.moveRecipe('dulse', -1);
    expect(shown()).toEqual([['hedge', 'sloe', 'haw', 'dulse'], ['shore'], ['lane']]);
    order.moveChapter('lane', -1);
    order.moveRecipe('dulse', 1);
    expect(shown()).toEqual([['hedge', 'sloe', 'haw'], ['lane', 'dulse'], ['shore']]);
  });

  it('stays where the book begins and ends, and saves nothing then', () => {
    const { order, saves, shown } = bind();
    const before = shown();
    expect(order.moveRecipe('sloe', -1)).toBeNull();
    order.moveChapter('lane', 1);
    order.moveChapter('hedge', -1);
    expect(shown()).toEqual(before);
    expect(saves).toEqual([]);
  });

  it('shows what the house holds where a move is refused, and says why', async () => {
    const refusal = new Error('Somebody else moved first.');
    const { order, saves, shown } = bind(refusal);
    order.moveChapter('hedge', 1);
    saves[0]!.done();
    await settled();
    expect(order.state.value).toBe('failed');
    expect(order.error.value).toBe(refusal);
    expect(shown().map(([id]) => id)).toEqual(['shore', 'hedge', 'lane']);
  });
});
