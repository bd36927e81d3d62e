import type { Operation } from '../contracts/recipe-document.ts';

export interface StepWord {
  /** Of what is done: clauses of one action that follow each other are one step. */
  action: string;
  pattern: RegExp;
  operation: Operation | null;
  /** Waiting, not hands-on. */
  passive?: true;
}

const heat = (liveliness: 'warm' | 'simmer' | 'boil'): Operation => ({ kind: 'heat', covered: false, liveliness });
const strain: Operation = { kind: 'strain', lossShare: null };

/** Verbs of the bench and what they do; the first place in a clause wins, then the first entry. Add one with its test. */
export const STEP_WORDS: readonly StepWord[] = [
  {
    action: 'shake',
    pattern: /\b(dry[- ]shake|(re)?shake (it|hard|again|with|until|everything)|shake (?!the)|shaking (?!(it|the)))/,
    operation: { kind: 'shake' },
  },
  {
    action: 'boil',
    pattern: /\b(boil (it|this|that|for|until|the)|bring (it |this |that )?(up )?to (a|the) boil)\b/,
    operation: heat('boil'),
  },
  { action: 'simmer', pattern: /\bsimmer(s|ing)?\b/, operation: heat('simmer') },
  { action: 'reduce', pattern: /\breduc(e|ing)\b/, operation: { kind: 'reduce', to: null } },
  {
    action: 'infuse',
    pattern: /\b(steep|infus(e|ing)|macerat(e|ing)|soak(ing)? (them|it|the|for|in))\b/,
    operation: { kind: 'infuse' },
    passive: true,
  },
  {
    action: 'warm',
    pattern:
      /\b(warm (it|this|that|the|them|gently|through)|heat (it|this|up|the|gently)|melt (it|the)|low(est)? heat|gentle heat|medium heat|on the heat|into a (little |small )?(saucepan|pan) on)\b/,
    operation: heat('warm'),
  },
  {
    action: 'toast',
    pattern: /\b(toast (it|them|the|until|in)|roast (it|them|the|your|for)|into the oven|dry frying pan)\b/,
    operation: heat('warm'),
  },
  {
    action: 'filter',
    pattern: /\b(through (a |the )?(coffee |paper )?filter|filter (it|through|this)|let it (drip|hang))\b/,
    operation: strain,
  },
  {
    action: 'strain',
    pattern:
      /\b((double |fine )?strain(ing)? (it|them|this|that|off|out|into|through|first|so|thro)|double straining|strain$|drain (it|them|the)|pass (it|this) through|through (a |the )?(\w+ )?(muslin|cloth|sieve|strainer|bag)|into (a |the )?([\w-]+ ){0,2}bag|squeeze (it|them|out))\b/,
    operation: strain,
  },
  {
    action: 'blend',
    pattern: /\b(blend|blitz|whizz|go in the blender|in the blender)\b/,
    operation: { kind: 'blend' },
  },
  {
    action: 'stir',
    pattern:
      /\b((one |a )?stir(ring)?( (it|in|that|this|until|till|with|for|again|through|down|once|well|hard|over|gently|the))?|dissolve|whisk|mix (it|them|the|well))\b/,
    operation: { kind: 'stir' },
  },
  { action: 'throw', pattern: /\bthrow (it|the drink) (between|from)\b/, operation: { kind: 'throw' } },
  {
    action: 'cool',
    pattern:
      /\b(let (it|that|this|them|them all|it all) (all )?cool|cool ((it|them|this|that)\b|(right )?(down|completely))|leave (it|them) to cool|let it go cold|it can cool|chill (it|the|for)|put (it|the \w+|your \w+) in the freezer|ice bath)\b/,
    operation: { kind: 'cool' },
    passive: true,
  },
  {
    action: 'bottle',
    pattern:
      /(^\W*(then |now )?bottle\b(?! of)|\bbottle (it|them|this|up|hot)\b|\binto (a |the |its |their )?(own |clean |scalded |sterilised )*(bottles?|jars?)\b|\bput it in a (bottle|jar)\b)/,
    operation: { kind: 'bottle', sealed: true },
  },
  {
    action: 'wait',
    pattern:
      /\b(rest(s)? (it|for|covered|,)|then it rests|leave (it|them|that|this)( \w+)? (for|to (stand|sit|rest|infuse|settle)|overnight|a|in|somewhere|until)|leave \d|leave (for|to (stand|sit|rest|infuse)|until|overnight)|let (it|them|that|this) (sit|stand|rest|settle|infuse)|stand for|cover (it|and)|^\W*cover\b|put a lid|(into|in) the fridge|^\W*fridge|give it (a|an|\d+|\w+) (minute|minutes|hour|hours|day|days|week))\b/,
    operation: { kind: 'infuse' },
    passive: true,
  },
  {
    action: 'fill',
    pattern: /\b(fill (it|the|with|up)|ice, fill|^\W*ice\b|add (the )?ice)\b/,
    operation: { kind: 'add' },
  },
  { action: 'top', pattern: /\btop (it )?(up )?(with|w)\b/, operation: { kind: 'add' } },
  {
    action: 'add',
    pattern:
      /\b(add(ing)?|pour( it| them| the| that| over| in)?|tip (it|them|the|in)|in goes|goes in|go in|\w+ in, |scrape in|fold in|put (it|them|the|in|everything))\b/,
    operation: { kind: 'add' },
  },
  { action: 'crack', pattern: /\b(crack (it|the|an|one|your)|separate)\b/, operation: null },
  {
    action: 'rub',
    pattern: /\b(rub (it|them)|peel (it|them|the)|zest (it|the)|chop|slice (it|them|the)|grate)\b/,
    operation: null,
  },
  { action: 'crush', pattern: /\b(crush|squash|mash|muddle|bash|bruise)\b/, operation: null },
  { action: 'measure', pattern: /\b(weigh (it|them|the)|measure (it|how|the)|scales on)\b/, operation: null },
  { action: 'taste', pattern: /\btaste it\b/, operation: null },
  { action: 'garnish', pattern: /\b(garnish|express|float|on top|to finish)\b/, operation: null },
  { action: 'skim', pattern: /\bskim (it|off|the)\b/, operation: null },
  { action: 'label', pattern: /\b(label it|write on it|write the date)\b/, operation: null },
];

/** Before a verb these make it talk: what others do, what must not be done, what was done once. */
export const NOT_DONE =
  /\b(if (you|it)|used to|somebody|someone|people|asked|ask|don't|doesn't|didn't|do not|never|not to|can't|why|would|wouldn't|last time|because|won't|when i)\b[^,]*$/i;

export const TOOLS: readonly string[] = (
  'nut milk bag,hawthorne strainer,fine strainer,julep strainer,tea strainer,fine sieve,coarse sieve,sieve,strainer,muslin,' +
  'cheesecloth,coffee filter,paper filter,cloth,tea towel,baking tray,oven,frying pan,saucepan,little pan,pan,bowl,jug,funnel,' +
  'thermometer,precision scale,scales,scale,blender,food processor,jar,swing-top bottle,shaker,mixing glass,bar spoon,long spoon,' +
  'wooden spoon,ladle,masher,peeler,grater,whisk,toothpick,muddler,syphon,juicer,fork,knife,freezer,fridge,coupe,highball glass,' +
  'rocks glass,wine glass,bottles,bottle'
).split(',');
