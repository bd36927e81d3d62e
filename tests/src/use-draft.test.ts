import { describe, expect, it } from 'vitest';
import { useDraft } from '../../src/composables/useDraft.ts';

describe('what is written over something that others may change', () => {
  it('names what others changed, and saving over it keeps theirs where nothing was written here', () => {
    let saved = { fields: { title: 'Berries', days: 7 }, version: 1 };
    const writing = useDraft(() => saved);
    writing.draft.value.title = 'Hedge berries';
    expect(writing.dirty.value).toBe(true);

    saved = { fields: { title: 'Lane berries', days: 9 }, version: 2 };
    writing.keepOver();
    expect(writing.draft.value).toEqual({ title: 'Hedge berries', days: 9 });
    expect(writing.version.value).toBe(2);
    expect(writing.dirty.value).toBe(true);
  });

  it('begins anew from what is saved', () => {
    const writing = useDraft(() => ({ fields: { title: 'Berries' }, version: 3 }));
    writing.draft.value.title = 'Hedge berries';
    writing.begin();
    expect(writing.draft.value).toEqual({ title: 'Berries' });
    expect(writing.dirty.value).toBe(false);
  });
});
