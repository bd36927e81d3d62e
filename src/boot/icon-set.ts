import type { QuasarIconSet } from 'quasar';
import { ICONS, type IconName } from '@/components/icons.ts';

/** A drawing in the notation in which Quasar takes inline pictures. */
function drawn(name: IconName): string {
  return `${ICONS[name]}@@fill:none;stroke:currentColor;stroke-width:1.5;stroke-linecap:round;stroke-linejoin:round|0 0 24 24`;
}

const [up, down, forward, check, close, warning, plus] = (
  ['up', 'down', 'forward', 'check', 'close', 'warning', 'plus'] as const
).map(drawn) as [string, string, string, string, string, string, string];
const back = 'M20 12H4.5M10.5 6l-6 6 6 6@@fill:none;stroke:currentColor;stroke-width:1.5|0 0 24 24';

/** Our own drawings, for those parts of Quasar that this client uses; the type asks for all of its parts. */
export const iconSet = {
  name: 'steep-and-bind',
  type: { positive: check, negative: warning, info: drawn('query'), warning },
  arrow: { up, right: forward, down, left: back, dropdown: down },
  chevron: { left: back, right: forward },
  chip: { remove: close, selected: check },
  expansionItem: { icon: down, denseIcon: down },
  field: { clear: close, error: warning },
  pagination: { first: back, prev: back, next: forward, last: forward },
  tabs: { left: back, right: forward, up, down },
  table: { arrowUp: up, warning, firstPage: back, prevPage: back, nextPage: forward, lastPage: forward },
  uploader: { done: check, clear: close, add: plus, upload: up, removeQueue: close, removeUploaded: close },
} as Partial<QuasarIconSet> as QuasarIconSet;
