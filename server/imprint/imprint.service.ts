import type { Knex } from 'knex';
import type { ImprintDraft, ImprintPublic, ImprintSettings } from '../../shared/contracts/imprint.ts';
import { renderMarkdown } from '../content/markdown.ts';
import { versionConflict } from '../http/http.errors.ts';
import { hasOpenTiers } from '../tiers/tiers.queries.ts';
import { currencyInUse } from './imprint.errors.ts';
import { readImprint, updateImprint, type ImprintRow } from './imprint.queries.ts';

/** What everyone may know of the house. */
export async function viewImprint(db: Knex): Promise<ImprintPublic> {
  const row = await readImprint(db);
  return {
    name: row.name,
    currency: row.currency,
    zone: row.zone,
    ageLimit: row.age_limit,
    termsHtml: renderMarkdown(row.terms),
    privacyHtml: renderMarkdown(row.privacy),
  };
}

export async function viewSettings(db: Knex): Promise<ImprintSettings> {
  return toSettings(await readImprint(db));
}

/** Saves the settings; the currency stays while tiers are sold in it. */
export async function saveSettings(db: Knex, draft: ImprintDraft, expected: number): Promise<ImprintSettings> {
  return db.transaction(async (trx) => {
    const before = await readImprint(trx);
    if (before.currency !== draft.currency && (await hasOpenTiers(trx))) throw currencyInUse();
    const { ageLimit, graceDays, ...same } = draft;
    const row = await updateImprint(trx, { ...same, age_limit: ageLimit, grace_days: graceDays }, expected);
    if (!row) throw versionConflict();
    return toSettings(row);
  });
}

function toSettings({
  name,
  currency,
  zone,
  age_limit,
  grace_days,
  terms,
  privacy,
  version,
}: ImprintRow): ImprintSettings {
  return { name, currency, zone, ageLimit: age_limit, graceDays: grace_days, terms, privacy, version };
}
