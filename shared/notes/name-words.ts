const set = (words: string) => new Set(words.split(/\s+/));

/** Nouns that end the name of something that goes in: "gooseberry shrub", "almond extract". */
export const HEADS = set(
  'juice syrup cordial shrub liqueur vinegar bitters water peel zest sugar extract essence oil tea milk cream powder seed ' +
    'seeds leaf leaves flower flowers petals berry berries root bark salt honey jam marmalade wine brandy rum gin vodka whisky ' +
    'whiskey vermouth soda tonic cider beer brine saline nut nuts stock puree purée paste sauce infusion tincture',
);

/** Heads that make another thing of what stands before them: almond, almond extract. */
export const DERIVED = set(
  'juice syrup cordial shrub liqueur vinegar bitters peel zest extract essence oil tea milk cream powder seed seeds leaf leaves ' +
    'flower flowers petals root bark wine brandy jam marmalade brine puree purée paste sauce infusion tincture',
);

/** Heads that pour; of them an ounce is a fluid ounce. */
export const POURED = set(
  'juice syrup cordial shrub liqueur vinegar bitters water extract essence oil tea milk cream wine brandy rum gin vodka whisky ' +
    'whiskey vermouth soda tonic cider beer brine saline aquafaba stock infusion tincture',
);

/** Alone these are another ingredient, whatever name of two words they also end: water is no orange flower water. */
export const PLAIN_HEADS = set('water milk oil cream salt tea soda');

/** Adjectives that belong to a name. */
export const NAME_ADJECTIVES = set(
  'dry white red sweet dark light golden aged toasted roasted smoked blanched aromatic bitter sour candied crystallised dried ' +
    'ground black green pink brown orange flower old',
);

/** Words between an amount and a name that tell its state, its size or nothing. */
export const BETWEEN = set(
  'of the a an some your our my that this these those good nice proper big little small tiny fresh freshly squeezed cold cool warm ' +
    'hot boiling iced chilled filtered ripe whole fine coarse coarsely finely cracked crushed chopped sliced peeled pressed clean ' +
    'really very quite decent plain unsweetened raw frozen ordinary cheap strong weak more extra another further fat heaped level ' +
    'scant generous about roughly around kind picked still soft thick thin',
);

/** States that are kept as preparation when they stand before a name. */
export const STATES = set(
  'fresh freshly squeezed cold warm hot boiling chilled filtered ripe crushed cracked chopped sliced peeled frozen coarse fine ' +
    'finely coarsely raw',
);

/** Things that are counted: an article before them counts as one. */
export const COUNTABLE = set(
  'white yolk egg leaf pod stick lemon lime orange grapefruit cucumber chilli apple pear peach vanilla cherry olive onion',
);

/** Words that end the name of something unknown, or that cannot begin it. */
export const STOPS = set(
  'and then into to in for until till with on over at about just it its is that so because we i you he she they or from goes go ' +
    'comes per no not never only what which while when but if of this the a an there here before after each every again maybe ' +
    'please twice once will should can did do does was were am are be been still also too off up down through as by out them me ' +
    'us her his their my your our some any than like now okay ok right um well yes yeah oh one ones stuff thing things lot bit way ' +
    "it's that's i'm i've we're we've you're don't isn't aren't there's what's let's they're he's she's you've i'd i'll we'll " +
    'have has had get got make makes give gives put add pour tip stir shake strain use used take leave need want let keep cover ' +
    'more less same other another all both half around under whole batch glass bottle jar recipe total exactly today please ' +
    'quarter quarters third thirds couple dozen maximum max min each sure going first last next time second third weight really very much many few straight cut',
);
