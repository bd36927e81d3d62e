import type { Operation } from '../contracts/recipe-document.ts';

interface StepWord {
  pattern: RegExp;
  operation: Operation | null;
  passive?: true;
}

/** Verbs of the bench and what they do; the first that is met names the step's operation. Add one with its test. */
export const STEP_WORDS: readonly StepWord[] = [
  { pattern: /\b(boil|bring (it |this )?(up )?to (a|the) boil)\b/i, operation: heat('boil') },
  { pattern: /\b(simmer|gentle heat)\w*\b/i, operation: heat('simmer') },
  { pattern: /\breduc(e|ing)\b/i, operation: { kind: 'reduce', to: null } },
  { pattern: /\b(steep|infus|macerat|overnight)\w*/i, operation: { kind: 'infuse' }, passive: true },
  { pattern: /\b(warm|heat|melt|toast)(s|ed|ing)?\b/i, operation: heat('warm') },
  { pattern: /\b(strain|sieve|muslin|filter|drip)\w*/i, operation: { kind: 'strain', lossShare: null } },
  { pattern: /\b(shake|shaking|dry shake)\b/i, operation: { kind: 'shake' } },
  { pattern: /\b(blend|blitz|whizz)\w*/i, operation: { kind: 'blend' } },
  { pattern: /\b(stir|dissolve|whisk|mix)(s|d|ed|ring|ing)?\b/i, operation: { kind: 'stir' } },
  { pattern: /\b(cool|chill|ice bath|freez)\w*/i, operation: { kind: 'cool' }, passive: true },
  {
    pattern:
      /^\W*(then )?bottle\b|\bbottle (it|them|this|up|hot)\b|\binto (a |the )?(clean |scalded )?(bottle|jar)s?\b/i,
    operation: { kind: 'bottle', sealed: true },
  },
  {
    pattern: /\b(rest|leave|let (it|them) (sit|stand|hang)|sit|stand|cover)\b/i,
    operation: { kind: 'infuse' },
    passive: true,
  },
  { pattern: /\b(add|pour|tip|in goes|goes in|scrape|fold|top up|put)\b/i, operation: { kind: 'add' } },
  {
    pattern:
      /\b(crush|squash|mash|muddle|peel|zest|chop|slice|squeeze|juice|crack|bash|press|skim|label|hold)(s|ed|ing)?\b/i,
    operation: null,
  },
];

function heat(liveliness: 'warm' | 'simmer' | 'boil'): Operation {
  return { kind: 'heat', covered: false, liveliness };
}

/** What a cue does, by its first word of the bench; null for talk. */
export function stepWordIn(text: string): StepWord | null {
  return STEP_WORDS.find(({ pattern }) => pattern.test(text)) ?? null;
}

export const YIELD_WORDS =
  /\b(makes?|gets?|yields?|comes? (out )?to|gives?|you('ll| will)? get|ended up with|that's about)\b/i;
export const KEEPING_WORDS =
  /\b(fridge|refrigerator|keeps?|keep it|lasts?|shelf|freezer|use (it )?(up )?(within|by)|then make another)\b/i;
export const KITCHEN =
  /\b(muslin|sieve|fine strainer|strainer|saucepan|pan|bowl|jug|funnel|thermometer|scales?|blender|jar|swing-top bottle|bottle|shaker|mixing glass|bar spoon|masher|peeler|grater|coffee filter|tea strainer|whisk)\b/gi;
