import { createHash } from 'node:crypto';

const DEMO = '5b1e9d6a-c4a7-4f0f-9c0e-6b8a2f7d3e11';

/** The UUID of version 5 (RFC 9562, section 5.5) of a name in a namespace: the same name gives the same id for ever. */
export function stableId(namespace: string, name: string): string {
  const space = Buffer.from(namespace.replaceAll('-', ''), 'hex');
  const bytes = createHash('sha1').update(space).update(name, 'utf8').digest().subarray(0, 16);
  bytes.writeUInt8((bytes.readUInt8(6) & 0x0f) | 0x50, 6);
  bytes.writeUInt8((bytes.readUInt8(8) & 0x3f) | 0x80, 8);
  return bytes.toString('hex').replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, '$1-$2-$3-$4-$5');
}

/** The id that documents of the demo use for a recipe. */
export const recipeIdOf = (slug: string): string => stableId(DEMO, `recipe:${slug}`);

/** The id that documents of the demo use for a plate. */
export const plateIdOf = (file: string): string => stableId(DEMO, `plate:${file}`);
