import type { Lack } from '@shared/contracts/figures.ts';
import type { SubscriptionState } from '@shared/contracts/membership.ts';
import type { OperationKind } from '@shared/contracts/recipe-document.ts';
import type { RecipeState, Role, Unit } from '@shared/contracts/words.ts';
import { WORDING } from '@shared/wording/en.ts';

/** The names of the trade's words. A pair divided by a bar is singular and plural. */
export const words = {
  ...WORDING,

  state: {
    draft: 'Draft',
    'on-trial': 'On trial',
    'with-editor': 'With editor',
    cleared: 'Cleared',
    out: 'Out',
    withdrawn: 'Withdrawn',
  } satisfies Record<RecipeState, string>,

  role: {
    creator: 'Creator',
    editor: 'Editor',
    admin: 'Admin',
  } satisfies Record<Role, string>,

  unit: {
    ml: 'ml',
    cl: 'cl',
    l: 'l',
    g: 'g',
    kg: 'kg',
    oz: 'oz',
    lb: 'lb',
    floz: 'fl oz',
    tsp: 'tsp',
    tbsp: 'tbsp',
    cup: 'cup | cups',
    pint: 'pint | pints',
    quart: 'quart | quarts',
    gill: 'gill | gills',
    'imp-floz': 'imp fl oz',
    'imp-pint': 'imp pint | imp pints',
    'imp-quart': 'imp quart | imp quarts',
    'imp-gill': 'imp gill | imp gills',
    dash: 'dash | dashes',
    drop: 'drop | drops',
    barspoon: 'barspoon | barspoons',
    pinch: 'pinch | pinches',
    splash: 'splash | splashes',
    piece: 'piece | pieces',
    part: 'part | parts',
    leaf: 'leaf | leaves',
    sprig: 'sprig | sprigs',
    handful: 'handful | handfuls',
    slice: 'slice | slices',
    twist: 'twist | twists',
    strip: 'strip | strips',
    stick: 'stick | sticks',
    pod: 'pod | pods',
    drink: 'drink | drinks',
    bottle: 'bottle | bottles',
  } satisfies Record<Unit, string>,

  operation: {
    add: 'Add',
    heat: 'Heat',
    reduce: 'Reduce',
    infuse: 'Infuse',
    strain: 'Strain',
    cool: 'Cool',
    shake: 'Shake',
    stir: 'Stir',
    blend: 'Blend',
    throw: 'Throw',
    carbonate: 'Carbonate',
    clarify: 'Clarify',
    'fat-wash': 'Fat-wash',
    bottle: 'Bottle',
  } satisfies Record<OperationKind, string>,

  liveliness: { warm: 'Warm', simmer: 'Simmer', boil: 'Boil' },

  attention: { 'hands-on': 'Hands-on', waiting: 'Waiting' },

  lack: {
    'amount-missing': 'no amount for {subject}',
    'unit-missing': 'no unit for {subject}',
    'density-missing': 'the density of {subject} is not known',
    'piece-weight-missing': 'the weight of one {subject} is not known',
    'not-in-larder': '{subject} is not in the larder',
    'strength-missing': 'the strength of {subject} is not known',
    'sugar-missing': 'the sugar in {subject} is not known',
    'yield-missing': 'no yield is stated for {subject}',
    'duration-missing': 'no time for “{subject}”',
    'component-missing': 'the recipe of {subject} is missing',
    'loss-unknown': 'what is lost at “{subject}” is not known',
    'keeping-missing': 'no keeping is stated for {subject}',
    'step-cycle': 'the steps wait for each other at {subject}',
    'component-cycle': '{subject} goes into itself',
  } satisfies Record<Lack['code'], string>,

  membership: {
    incomplete: 'Payment not finished',
    incomplete_expired: 'Never begun',
    trialing: 'On trial',
    active: 'Active',
    past_due: 'Payment overdue',
    canceled: 'Ended',
    unpaid: 'Not paid',
    paused: 'Paused',
  } satisfies Record<SubscriptionState, string>,
};
