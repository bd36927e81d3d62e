import { toGrams, toMillilitres } from '../engine/units.ts';
import type { Link } from './link-amounts.ts';
import type { Mention } from './mentions.ts';
import { HEADS, PLAIN_HEADS, POURED } from './name-words.ts';
import { wordsBefore, type Transcript } from './tokens.ts';
import { stem, type Known } from './vocabulary.ts';

/** One thing with all places that name it and the amount that holds. */
export interface Group {
  name: string;
  known: Known | null;
  mentions: Mention[];
  links: Link[];
  amount: Link | null;
  optional: boolean;
  /** An amount was said of it, beyond "a" or a shape. */
  sure: boolean;
  /** Made on the way and carried over whole. */
  intermediate: boolean;
}

/** Brings together all mentions of one thing: singular and plural, other names, "the syrup" for the one that was named in full. */
export function foldMentions(transcript: Transcript, mentions: readonly Mention[], links: readonly Link[]): Group[] {
  const groups = new Map<string, Group>();
  const groupOf = new Map<Mention, Group>();
  for (const mention of mentions) {
    const key = mention.known?.larderId ?? wordsIn(mention.name).join(' ');
    const group = groups.get(key) ?? blank(mention);
    group.mentions.push(mention);
    groups.set(key, group);
    groupOf.set(mention, group);
  }
  for (const link of links) groupOf.get(link.mention)?.links.push(link);
  const folded = foldShort([...groups.values()]);
  return folded.map((group) => settled(transcript, group)).sort((a, b) => a.mentions[0]!.from - b.mentions[0]!.from);
}

function blank({ known, name }: Mention): Group {
  return { name, known, mentions: [], links: [], amount: null, optional: false, sure: false, intermediate: false };
}

const wordsIn = (name: string) => name.split(/[\s-]+/).map(stem);

/** A short name goes into the longer one that holds its words: "lemon" into "lemon juice", "the shrub" into "gooseberry shrub". */
function foldShort(groups: readonly Group[]): Group[] {
  const bySize = [...groups].sort((a, b) => shortest(a) - shortest(b));
  const gone = new Set<Group>();
  for (const short of bySize) {
    const into = bySize.filter((long) => long !== short && !gone.has(long) && holds(long, short));
    const target =
      into.find((long) => agree(long.links, short.links) && isMeasured(long)) ?? into.find(isMeasured) ?? into[0];
    if (!target) continue;
    target.mentions.push(...short.mentions);
    target.links.push(...short.links);
    gone.add(short);
  }
  return bySize.filter((group) => !gone.has(group));
}

const isMeasured = ({ links }: Group) => links.some(({ implied }) => !implied);
const shortest = ({ mentions }: Group) => Math.min(...mentions.map(({ name }) => wordsIn(name).length));

function holds(long: Group, short: Group): boolean {
  const words = wordsIn(short.mentions.reduce((a, b) => (b.name.length > a.name.length ? b : a)).name);
  const inside = long.mentions.some(({ name }) => {
    const all = wordsIn(name);
    return all.length > words.length && words.every((word) => all.includes(word));
  });
  if (!inside) return false;
  const head = words.at(-1)!;
  const sameHead = long.mentions.some(({ name }) => wordsIn(name).at(-1) === head);
  if (sameHead && PLAIN_HEADS.has(head)) return false;
  const measured = short.links.filter(({ implied, unit }) => !implied && unit !== null);
  if (measured.length === 0) return sameHead || !short.mentions.some(({ said }) => said === 'optional');
  // "two cups of juice" is the sea buckthorn's when nothing else was said of it, or the same.
  return sameHead && short.mentions.every(({ bare }) => bare) && agree(long.links, measured);
}

function agree(links: readonly Link[], others: readonly Link[]): boolean {
  const own = links.filter(({ implied }) => !implied);
  return own.length === 0 || others.every((other) => own.some((link) => same(link, other) || sameFigure(link, other)));
}

function same(a: Link, b: Link): boolean {
  const [x, y] = [sizeOf(a), sizeOf(b)];
  return x.of === y.of && Math.abs(x.size - y.size) <= 0.02 * Math.max(x.size, y.size);
}

/** "three quarters lemon" tells again the three quarters of an ounce. */
const sameFigure = (a: Link, b: Link) => b.unit === null && a.value.min === b.value.min && a.value.max === b.value.max;

function sizeOf({ value: { min }, unit }: Link): { size: number; of: string } {
  if (unit === null) return { size: min, of: '' };
  const volume = toMillilitres(min, unit);
  if (volume !== null) return { size: volume, of: 'ml' };
  const mass = toGrams(min, unit);
  return mass !== null ? { size: mass, of: 'g' } : { size: min, of: unit };
}

function settled({ tokens }: Transcript, group: Group): Group {
  group.mentions.sort((a, b) => a.from - b.from);
  group.links.sort((a, b) => a.from - b.from);
  const named = group.mentions.filter(({ said }) => said !== 'refused' && said !== 'told');
  const full = (named.length > 0 ? named : group.mentions).reduce((a, b) => (words(b) > words(a) ? b : a));
  const known = full.known ?? (wordsIn(full.name).some((word) => HEADS.has(word)) ? null : group.known);
  const poured = known?.liquid === true || POURED.has(wordsIn(full.name).at(-1)!);
  const amount = holding(group.links, poured);
  const optionals = amount ? [amount.mention] : named;
  return {
    ...group,
    name: full.name,
    known,
    amount: amount && amount.unit === 'oz' && poured ? { ...amount, unit: 'floz' } : amount,
    optional:
      optionals.some(({ said }) => said === 'optional') ||
      (named.length > 0 && named.every(({ said }) => said === 'optional')),
    sure: group.links.some(({ implied, mention }) => !implied && mention.said !== 'told' && mention.said !== 'refused'),
    intermediate: known === null && group.mentions.some(({ from }) => MEASURED.test(wordsBefore(tokens, from, 6))),
  };
}

const words = ({ name }: Mention) => wordsIn(name).length;
const MEASURED = /\b(measure|weigh)( out)?( how much)?( of)?( the| your| that)?$/;

/** The amount that holds: the last that was said, bare numbers in the unit of the others, additions summed. */
function holding(links: readonly Link[], poured: boolean): Link | null {
  const told = links.filter(
    ({ mention, implied }) => !implied && mention.said !== 'told' && mention.said !== 'refused',
  );
  const unit = told.find((link) => link.unit !== null && link.unit !== 'bottle')?.unit ?? null;
  let held = null as Link | null;
  for (const link of told) {
    if (!held || (held.unit === 'bottle' && link.unit !== null && link.unit !== 'bottle')) held = link;
    else if (link.onTop && held.unit === link.unit) held = { ...held, value: sum(held.value, link.value) };
    else if (link.unit === null && held.unit !== null) continue;
    else if (link.unit === 'bottle' && held.unit !== null) continue;
    else if (same(held, link) || (held.near && !link.near && held.unit !== 'bottle' && held.unit !== null)) continue;
    else held = link;
  }
  held ??= links.find(({ implied, mention }) => implied && mention.said !== 'refused') ?? null;
  if (!held) return null;
  const { mention, value, from, to, near, implied, onTop } = held;
  return {
    mention,
    value,
    from,
    to,
    near,
    implied,
    onTop,
    unit: held.unit ?? unit ?? (poured ? pourOf(value.max) : 'piece'),
  };
}

/** "gin 35", "lime 3/4": bare figures of what pours are millilitres, small ones ounces (common practice). */
const pourOf = (value: number) => (value >= 5 ? 'ml' : 'floz');

const sum = (a: Link['value'], b: Link['value']) => ({ min: a.min + b.min, max: a.max + b.max });
