import type { PlateView } from '@shared/contracts/plates.ts';

export const plates = {
  lede: 'Photographs of the house, prepared for the book. A plate needs alt text before its recipe can be cleared.',
  count: 'no plates | {n} plate | {n} plates',
  without: '{n} without alt text',
  onlyWithout: 'No alt text yet',
  none: 'No plate yet',
  noneText: 'Bring photographs from the shoot: many at once, as large as they are.',
  more: 'Show {n} more',
  noneWithout: 'Every plate has its alt text',
  noneWithoutText: 'Nothing is left to write here.',

  drop: {
    title: 'Bring pictures',
    text: 'Drop them here, or choose files. JPEG, PNG, WebP, AVIF or TIFF, up to 60 MB and 100 megapixels each.',
    progress: '{n} of {all} brought in',
  },

  outcome: {
    title: 'What came of it',
    kept: 'Kept',
    refused: 'Refused: {reason}',
    unsent: 'Not sent: {reason}',
    waiting: 'Waiting',
    sending: 'On its way',
    summary: '{kept} kept, {refused} refused',
    again: 'Send again what did not arrive',
    clear: 'Put this list away',
  },

  state: {
    preparing: 'Preparing its sizes',
    ready: 'Ready',
    failed: 'Could not be prepared. Take it away and bring the picture again.',
  } satisfies Record<PlateView['state'], string>,
  pixels: '{width} × {height} px',

  words: {
    edit: 'Edit words',
    noAlt: 'No alt text yet',
    title: 'Words of the plate',
    alt: 'Alt text',
    altHint: 'What the picture shows, for those who do not see it. One or two sentences.',
    caption: 'Caption',
    credit: 'Credit',
    creditHint: 'Who took it.',
    creditOf: 'Photograph: {credit}',
    saved: 'The words are saved.',
  },

  remove: {
    action: 'Take away',
    ask: 'Take away this plate?',
    text: '{name} goes from the house. Released editions keep their own copy.',
    keep: 'Keep it',
    done: '{name} is taken away.',
  },

  pick: {
    choose: 'Choose {name}',
    empty: 'There is no plate that is ready.',
  },
};
