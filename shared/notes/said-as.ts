/**
 * How something is named: what stands around a name tells whether it goes in. `before` are the words up to the name, back to
 * the beginning of the sentence; `after` those that follow. Add a pattern here together with its test.
 */
export interface Surroundings {
  before: string;
  after: string;
  /** A longer way back, for who is asking and what is told of. */
  earlier: string;
}

export type SaidAs = 'added' | 'optional' | 'refused' | 'told' | 'named';

const REFUSED_BEFORE = [
  /\b(no|not|never|nor|without|neither) ((any|a|an|the) )?(\w+ )?$/,
  /\b(not using|not use|not add|don't use|don't add|didn't use|not put|skip|avoid|instead of|rather than|out of)( \w+)? $/,
  /\bleave (out )?(the )?$/,
];
const REFUSED_AFTER = [/^\? (no|nope|never)\b/, /^(in (it|this|there) )?no\b(?! ?([,.-]|sorry|wait|make))/, /^out\b/];
/** "or the coconut goes": what happens to it, not what to take. */
const BEFALLS = /^(goes|gets|is|are|was|will|turns|tastes|comes|has|have)\b/;

const TOLD_BEFORE = [
  /\b(asked?|asking|asks)( me)?( about| for| if| whether| can| could)?\b( [\w']+){0,6} ?$/,
  /\b(tastes?|smells?|looks?|bit) (\w+ )?like( [\w']+){0,3} ?$/,
  /\b(goes|go|turns?) (from|to) (\w+ )?$/,
];
/** Serving and the next shoot: what is poured there is no part of this recipe. */
const TOLD_EARLIER = [
  /\b(what (do|would) (you|i|we) do with (it|this)|how (do|would) (i|you|we) (drink|serve|use) (it|this)|i drink it|to serve)\b/,
  /\b(once tried|i tried|i've tried)\b[^.?!\n]{0,25}$/,
];

const OPTIONAL_BEFORE = [
  /\b(you|i|we|some people) (can|could|might|may) (also )?(add|use|put|throw|have|swap)( in)?( [\w/.,½¼-]+){0,8} $/,
  /\b(optional(ly)?|(?<!\b(\d+|one|two|three|four|five|six|seven|eight|nine|ten|eleven|fifteen|twenty|thirty) )or|maybe|for a change)[ ,:]+((use|even|a|an|some|with) )*((\S+ ){1,4}of )?((\w+) )?$/,
];
const OPTIONAL_AFTER = [
  /^(?!or\b)(\W*[\w'-]+){0,4}\W+(if you (like|want|fancy|must)|if too \w+|optional|not needed|not essential|if using)\b/,
  /^(\W*[\w'-]+){0,1} instead\b/,
  /^(\W*[\w']+){0,6}\W*(that's|which is|it's) optional\b/,
  /^(work|works)\b[^.]{0,3}\? yes/,
];

const ADDED_BEFORE = [
  /\b(add|adding|added|stir in|goes|top (it )?(up )?(with|w \/|w)|fill (it )?with|cover (it|them|that) with|in goes|in go)( [\w-]+){0,3} $/,
  /\b(put( in)?|we have|we've got|you need|you want|you'll need|we need|use|using|pour( in)?|tip( in)?|throw in|squeeze( in)?|plus|take)( [\w-]+){0,3} $/,
  /(^|\b(then|and then|so|finally|now),? )(some|a few|a little|plenty of|a bit of) (\w+ )?$/,
  /\b(some|a few|a little|plenty of|a bit of|enough) (\w+ )?$/,
];
const ADDED_AFTER = [
  /^,? ?(goes|go|going) in(to)?\b/,
  /^in( ,| and\b|$)/,
  /^into the (\w+ )?(jar|pan|saucepan|shaker|glass|bowl|bottle|tin|blender|jug)\b/,
  /^,? ?(to top|on top|to finish|to taste)\b/,
];

const some = (patterns: readonly RegExp[], text: string) => patterns.some((pattern) => pattern.test(text));

/** Whether what is named goes in, may go in, stays out, or is only talked of. */
export function saidAs({ before, after, earlier }: Surroundings): SaidAs {
  const lead = before === '' ? '' : `${before} `;
  if (some(REFUSED_BEFORE, lead) || some(REFUSED_AFTER, after)) return 'refused';
  if (some(TOLD_BEFORE, lead) || some(TOLD_EARLIER, earlier)) return 'told';
  if ((some(OPTIONAL_BEFORE, lead) && !BEFALLS.test(after)) || some(OPTIONAL_AFTER, after)) return 'optional';
  if (some(ADDED_BEFORE, lead) || some(ADDED_AFTER, after)) return 'added';
  return 'named';
}

/** A row or sentence that tells of another drink: the version without alcohol, how it is served. */
export const OTHER_DRINK =
  /^(\W*)(\d+ ?% version|0 ?%|zero|virgin|alcohol-free|non-alcoholic|variation|version|to serve|serve|use)\b( \w+)?( ?:| -|,|$)/;

/** Amounts that no longer hold: "I used to do fifty". */
export const PAST =
  /(\bthen i did|\b(used to|old recipe|last time|last year|normally|if you (had|have|get|were|made)|i'd use|you'd use|at first|originally)\b( (?!so\b|now\b|and\b|but\b|today\b|i've\b)[\w',-]+){0,10}) ?$/;
/** Amounts that come on top of what was said before. */
export const ON_TOP = /\b(another|more|extra|remaining|the rest|second half|other half|again)\b/;
