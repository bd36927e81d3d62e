import { newId } from './ids.ts';
import { SCHEMA } from './schema.ts';
import type { EventType, WireEvent } from './wire.ts';
import type { Work } from './work.ts';

export const API_VERSION = '2026-10-28.endive';

function isHash(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** Whether two JSON values say the same, whatever the order of their keys. */
export function sameJson(a: unknown, b: unknown): boolean {
  if (Array.isArray(a) && Array.isArray(b)) return a.length === b.length && a.every((item, i) => sameJson(item, b[i]));
  if (isHash(a) && isHash(b)) {
    const keys = new Set([...Object.keys(a), ...Object.keys(b)]);
    return [...keys].every((key) => sameJson(a[key], b[key]));
  }
  return a === b;
}

/** The former values of what changed: hashes key by key, lists whole, `null` for a key that is new. */
export function previousAttributes(before: object, after: object): Record<string, unknown> {
  const then = before as Record<string, unknown>;
  const now = after as Record<string, unknown>;
  const previous: Record<string, unknown> = {};
  for (const key of new Set([...Object.keys(then), ...Object.keys(now)])) {
    const [was, is] = [then[key], now[key]];
    if (sameJson(was, is)) continue;
    previous[key] = isHash(was) && isHash(is) ? previousAttributes(was, is) : (was ?? null);
  }
  return previous;
}

/** Records that something happened, in the transaction that makes it happen; delivery follows the commit. */
export async function emit(
  work: Work,
  type: EventType,
  created: number,
  object: object,
  previous?: object,
): Promise<void> {
  const event: WireEvent = {
    id: newId('evt'),
    object: 'event',
    api_version: API_VERSION,
    created,
    data: { object, ...(previous === undefined ? {} : { previous_attributes: previous }) },
    livemode: false,
    pending_webhooks: 1,
    request: work.request,
    type,
  };
  await work.db
    .withSchema(SCHEMA)
    .into('events')
    .insert({ id: event.id, data: JSON.stringify(event) });
}
