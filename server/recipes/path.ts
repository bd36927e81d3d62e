import type { RecipeState, Role } from '../../shared/contracts/words.ts';

const STAFF: readonly Role[] = ['creator', 'editor', 'admin'];
const ISSUERS: readonly Role[] = ['creator', 'admin'];

/**
 * Where a working copy may go by hand, and who may send it there. Out is missing as an end: only releasing a leaf or issuing an
 * edition puts a recipe out.
 */
const PATH: Readonly<Record<RecipeState, Partial<Record<RecipeState, readonly Role[]>>>> = {
  draft: { 'on-trial': STAFF, withdrawn: ISSUERS },
  'on-trial': { draft: STAFF, 'with-editor': STAFF, withdrawn: ISSUERS },
  'with-editor': { 'on-trial': STAFF, cleared: STAFF, withdrawn: ISSUERS },
  cleared: { 'with-editor': STAFF, withdrawn: ISSUERS },
  out: { withdrawn: ISSUERS },
  withdrawn: { draft: ISSUERS },
};

/** The roles that may send a recipe from one state to another; none where the path does not go there. */
export function rolesFor(from: RecipeState, to: RecipeState): readonly Role[] {
  return PATH[from][to] ?? [];
}

/** Where these roles may send a recipe next. */
export function transitionsFor(from: RecipeState, roles: readonly Role[]): RecipeState[] {
  const ends = Object.keys(PATH[from]) as RecipeState[];
  return ends.filter((to) => rolesFor(from, to).some((role) => roles.includes(role)));
}

/** The state of a working copy once its text has changed: what was cleared or put out is a draft again. */
export function stateAfterSave(state: RecipeState): RecipeState {
  return state === 'cleared' || state === 'out' ? 'draft' : state;
}
