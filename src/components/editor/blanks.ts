import type { RecipeLine, RecipeSection, RecipeStep } from '@shared/contracts/recipe-document.ts';

/** An id that is new in its document: short, and never given twice. */
function newId(): string {
  return crypto.randomUUID().slice(0, 13);
}

export function blankLine(): RecipeLine {
  return {
    id: newId(),
    amount: null,
    unit: null,
    name: '',
    larderId: null,
    componentId: null,
    prep: '',
    note: '',
    optional: false,
    alternativeTo: null,
    scaling: { rule: 'linear' },
    source: null,
  };
}

export function blankSection(): RecipeSection {
  return { id: newId(), title: '', lines: [] };
}

export function blankStep(): RecipeStep {
  return {
    id: newId(),
    text: '',
    uses: [],
    operation: null,
    duration: null,
    attention: 'hands-on',
    temperature: null,
    tools: [],
    plateId: null,
    after: null,
    source: null,
  };
}
