import { z } from 'zod';
import { imprintDraft } from '../../shared/contracts/imprint.ts';
import { tierDraft, type TierDraft } from '../../shared/contracts/tiers.ts';
import type { DemoImprint } from './content.ts';
import { checkSource, checkValue, readMarkdown, readYaml } from './source-file.ts';
import { bodyParts } from './to-recipe-document.ts';

const writtenImprint = imprintDraft
  .omit({ terms: true, privacy: true })
  .extend({ country: z.string().regex(/^[A-Z]{2}$/, 'Write the two letters of ISO 3166-1.') });

/** The imprint of `imprint.md`, its terms and its privacy note from the parts of that name. */
export async function readImprint(dir: string): Promise<DemoImprint> {
  const source = await readMarkdown(dir, 'imprint.md');
  const written = checkSource(writtenImprint, source);
  const parts = bodyParts(source.body);
  const part = (heading: string) => parts.get(heading) ?? source.refuse([], `The part "${heading}" is missing.`);
  return { ...written, terms: part('Terms'), privacy: part('Privacy') };
}

const pounds = z.number().positive().multipleOf(0.01, 'Write pounds and pence.');
const writtenTiers = z.array(z.looseObject({ monthly: pounds, yearly: pounds }));

/** The tiers of `tiers.yaml`, prices from pounds to pence, in order of rank. */
export async function readTiers(dir: string): Promise<TierDraft[]> {
  const source = await readYaml(dir, 'tiers.yaml');
  const inPence = checkSource(writtenTiers, source).map((tier) => ({
    ...tier,
    monthly: Math.round(tier.monthly * 100),
    yearly: Math.round(tier.yearly * 100),
  }));
  const tiers = checkValue(z.array(tierDraft), inPence, source);
  tiers.forEach((tier, index) => {
    if (tier.rank !== index + 1) source.refuse([index, 'rank'], 'The tiers stand in order of rank, from 1.');
  });
  return tiers;
}
