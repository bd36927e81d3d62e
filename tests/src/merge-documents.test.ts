import { describe, expect, it } from 'vitest';
import { emptyRecipeDocument, recipeDocument, type RecipeDocument } from '../../shared/contracts/recipe-document.ts';
import { mergeDocuments, takeTheirs } from '../../src/components/editor/merge-documents.ts';
import { blankLine, blankStep } from '../../src/components/editor/blanks.ts';

function document(change: (draft: RecipeDocument) => void = () => undefined): RecipeDocument {
  const draft = emptyRecipeDocument('Damson shrub', 'shrub');
  draft.sections[0]!.lines = ['fruit', 'sugar', 'vinegar'].map((name) => ({ ...blankLine(), id: name, name }));
  draft.steps = ['crush', 'steep'].map((text) => ({ ...blankStep(), id: text, text }));
  draft.steps[0]!.uses = ['fruit', 'sugar'];
  change(draft);
  return draft;
}
const lineIds = ({ sections }: RecipeDocument) => sections.map(({ lines }) => lines.map(({ id }) => id).join(' '));

describe('two texts written over the same one', () => {
  it('takes what only one side changed from either', () => {
    const mine = document((draft) => {
      draft.headnote = 'Sharp and dark.';
      draft.sections[0]!.lines[1]!.amount = { min: 400, max: 400 };
    });
    const theirs = document((draft) => {
      draft.glass = 'highball';
      draft.sections[0]!.lines[2]!.name = 'cider vinegar';
      draft.steps[1]!.duration = { min: 86_400, max: 86_400 };
    });
    const { document: merged, clashes } = mergeDocuments(document(), mine, theirs);
    expect(clashes).toEqual([]);
    expect(merged).toEqual(
      document((draft) => {
        draft.headnote = 'Sharp and dark.';
        draft.glass = 'highball';
        draft.sections[0]!.lines[1]!.amount = { min: 400, max: 400 };
        draft.sections[0]!.lines[2]!.name = 'cider vinegar';
        draft.steps[1]!.duration = { min: 86_400, max: 86_400 };
      }),
    );
  });

  it('keeps mine and names it where both changed the same line, and can be settled for theirs', () => {
    const mine = document((draft) => (draft.sections[0]!.lines[1]!.name = 'caster sugar'));
    const theirs = document((draft) => (draft.sections[0]!.lines[1]!.name = 'brown sugar'));
    const { document: merged, clashes } = mergeDocuments(document(), mine, theirs);
    expect(merged).toEqual(mine);
    expect(clashes).toMatchObject([{ part: 'line', id: 'sugar', mine: { name: 'caster sugar' } }]);
    expect(takeTheirs(merged, clashes[0]!)).toEqual(theirs);
  });

  it('keeps lines that were added on both sides, each behind the one it followed', () => {
    const mine = document((draft) =>
      draft.sections[0]!.lines.splice(1, 0, { ...blankLine(), id: 'salt', name: 'salt' }),
    );
    const theirs = document((draft) => draft.sections[0]!.lines.push({ ...blankLine(), id: 'clove', name: 'clove' }));
    const { document: merged, clashes } = mergeDocuments(document(), mine, theirs);
    expect(clashes).toEqual([]);
    expect(lineIds(merged)).toEqual(['fruit salt sugar vinegar clove']);
  });

  it('lets a line go that the other side left alone, and no step uses it any longer', () => {
    const theirs = document((draft) => {
      draft.sections[0]!.lines.splice(1, 1);
      draft.steps[0]!.uses = ['fruit'];
    });
    const mine = document((draft) => (draft.steps[0]!.text = 'crush well'));
    const { document: merged, clashes } = mergeDocuments(document(), mine, theirs);
    expect(lineIds(merged)).toEqual(['fruit vinegar']);
    expect(clashes).toMatchObject([{ part: 'step', id: 'crush' }]);
    expect(merged.steps[0]).toMatchObject({ text: 'crush well', uses: ['fruit'] });
    expect(recipeDocument.safeParse(merged).success).toBe(true);
  });

  it('leaves a line where one side moved it', () => {
    const mine = document((draft) => {
      const [sugar] = draft.sections[0]!.lines.splice(1, 1);
      draft.sections.push({ id: 'later', title: 'Later', lines: [sugar!] });
    });
    const theirs = document((draft) => (draft.sections[0]!.lines[0]!.name = 'damsons'));
    const { document: merged } = mergeDocuments(document(), mine, theirs);
    expect(lineIds(merged)).toEqual(['fruit vinegar', 'sugar']);
    expect(merged.sections[0]!.lines[0]!.name).toBe('damsons');
    expect(recipeDocument.safeParse(merged).success).toBe(true);
  });
});
