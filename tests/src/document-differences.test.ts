import { describe, expect, it } from 'vitest';
import { emptyRecipeDocument, type RecipeDocument } from '../../shared/contracts/recipe-document.ts';
import { blankLine, blankStep } from '../../src/components/editor/blanks.ts';
import { documentDifferences } from '../../src/components/recipe/document-differences.ts';

function document(change: (draft: RecipeDocument) => void = () => undefined): RecipeDocument {
  const draft = emptyRecipeDocument('Damson shrub', 'shrub');
  draft.sections[0]!.lines = ['fruit', 'sugar'].map((name) => ({ ...blankLine(), id: name, name }));
  draft.steps = ['crush', 'steep'].map((text) => ({ ...blankStep(), id: text, text }));
  change(draft);
  return draft;
}

describe('what differs between two texts of a recipe', () => {
  it('is nothing between the same', () => {
    expect(documentDifferences(document(), document())).toEqual([]);
  });

  it('names fields, headings, lines and steps that changed, came or went', () => {
    const after = document((draft) => {
      draft.glass = 'highball';
      draft.sections[0]!.title = 'For the shrub';
      draft.sections[0]!.lines[0]!.name = 'damsons';
      draft.sections[0]!.lines.push({ ...blankLine(), id: 'salt', name: 'salt' });
      draft.steps.shift();
    });
    expect(documentDifferences(document(), after)).toMatchObject([
      { part: 'field', field: 'glass', before: '', after: 'highball' },
      { part: 'section', before: '', after: 'For the shrub' },
      { part: 'line', before: { name: 'fruit' }, after: { name: 'damsons' } },
      { part: 'line', before: undefined, after: { name: 'salt' } },
      { part: 'step', number: 1, before: { text: 'crush' }, after: undefined },
    ]);
  });

  it('says so when only the order changed', () => {
    const after = document((draft) => {
      draft.sections[0]!.lines.reverse();
      draft.steps.reverse();
    });
    expect(documentDifferences(document(), after)).toEqual([
      { part: 'order', of: 'lines' },
      { part: 'order', of: 'steps' },
    ]);
  });
});
