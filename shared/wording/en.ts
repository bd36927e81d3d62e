import type { Provenance, StrengthBand } from '../contracts/figures.ts';
import type { Keeping } from '../contracts/recipe-document.ts';
import type { Allergen, Caution, RecipeKind } from '../contracts/words.ts';

/** English words that stand on screen and in the typeset book alike; safety is worded in one place. */
export const WORDING = {
  kind: {
    drink: 'Drink',
    syrup: 'Syrup',
    cordial: 'Cordial',
    shrub: 'Shrub',
    infusion: 'Infusion',
    liqueur: 'Liqueur',
    bitters: 'Bitters',
    garnish: 'Garnish',
    ice: 'Ice',
    technique: 'Technique',
  } satisfies Record<RecipeKind, string>,

  allergen: {
    gluten: 'Cereals with gluten',
    crustaceans: 'Crustaceans',
    egg: 'Egg',
    fish: 'Fish',
    peanuts: 'Peanuts',
    soya: 'Soya',
    milk: 'Milk',
    nuts: 'Nuts',
    celery: 'Celery',
    mustard: 'Mustard',
    sesame: 'Sesame',
    sulphites: 'Sulphites',
    lupin: 'Lupin',
    molluscs: 'Molluscs',
  } satisfies Record<Allergen, string>,

  caution: {
    'spirit-near-heat': {
      title: 'Strong spirit near heat',
      text: 'The vapour of strong spirit catches fire. No flame and no spark nearby, the hob off unless a step says otherwise, windows open. Follow your local fire code.',
    },
    'hot-sugar': {
      title: 'Hot sugar',
      text: 'Hot syrup sticks and burns. Keep cold water within reach and children out of it, and follow the maker’s instructions for the pan.',
    },
    'raw-egg': {
      title: 'Raw egg',
      text: 'Not for anyone who is pregnant, very young, old or unwell. A pasteurised egg makes the same foam. Follow local food safety codes where you serve it to others.',
    },
    'fresh-keeping': {
      title: 'Keeping',
      text: 'Low in acid or freshly infused: keep it cold and use it soon. Keeping times are guidance, not a laboratory result. If it fizzes, clouds or smells of yeast, throw it away. Local food safety codes come first.',
    },
    'sealed-gas-pressure': {
      title: 'Sealed and under pressure',
      text: 'A sealed vessel can burst when gas builds up. Use one that is made for the pressure, follow its maker’s instructions, leave headspace, and open it cold and away from your face.',
    },
    'vacuum-bag': {
      title: 'Vacuum bag at low heat',
      text: 'Without air and at low temperatures the wrong bacteria thrive. Hold the stated temperature for the whole time, chill fast, and follow the maker’s instructions and the local code for this way of working.',
    },
    'dry-ice': {
      title: 'Dry ice',
      text: 'It burns skin and displaces air. Gloves, an open window, never in a closed vessel, never in a glass that is served. Follow the supplier’s instructions and your local code.',
    },
    'liquid-nitrogen': {
      title: 'Liquid nitrogen',
      text: 'It burns at once and displaces air. Trained people only, with the equipment made for it; nothing is served until all of it is gone. Follow the supplier’s instructions and licensed practice.',
    },
    'harmful-botanical': {
      title: 'A plant that can harm',
      text: 'One of the plants here harms in the wrong kind, part or amount. Buy it as food from a supplier who names it, keep to the amount, ask a doctor if you are pregnant or take medicines, and follow what your local code allows.',
    },
    'home-distilling': {
      title: 'Distilling is licensed work',
      text: 'Distilling alcohol without a licence is against the law in most places and dangerous everywhere. Leave it to licensed practice; buy the distillate.',
    },
    'grapefruit-medicines': {
      title: 'Grapefruit and medicines',
      text: 'Grapefruit changes how strongly some medicines act. Read the leaflet of yours, or ask a pharmacist.',
    },
  } satisfies Record<Caution, { title: string; text: string }>,

  keeping: {
    refrigerator: 'in the refrigerator',
    freezer: 'in the freezer',
    'cool-dark': 'cool and dark',
    room: 'at room temperature',
    'serve-at-once': 'serve at once',
  } satisfies Record<Keeping['place'], string>,

  keepingBasis: { stated: 'stated', guidance: 'guidance' } satisfies Record<Keeping['basis'], string>,

  provenance: {
    measured: 'measured',
    stated: 'stated',
    computed: 'computed',
    estimated: 'estimated',
  } satisfies Record<Provenance, string>,

  band: {
    none: 'No alcohol',
    light: 'Light',
    medium: 'Medium',
    strong: 'Strong',
    'very-strong': 'Very strong',
  } satisfies Record<StrengthBand, string>,
};

/** What stands at the end of every page and every book. */
export const GUIDANCE =
  'Keeping times are guidance, not a laboratory result. Follow local codes, the maker’s instructions and licensed practice.';
export const SENSIBLY = 'For adults. Drink sensibly.';
