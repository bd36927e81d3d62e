import type { Knex } from 'knex';
import type { z } from 'zod';
import type { AppContext } from '../context.ts';
import type { personList, personQuery, PersonRow as PersonView } from '../../shared/contracts/people.ts';
import type { Role } from '../../shared/contracts/words.ts';
import { versionConflict } from '../http/http.errors.ts';
import { lastAdmin, personNotFound } from './people.errors.ts';
import { findPerson, updatePerson } from './people.queries.ts';
import type { PersonRow } from './people.rows.ts';

const PAGE_SIZE = 50;

/** A page of the people of the house, newest first. */
export async function listPeople(db: Knex, query: z.output<typeof personQuery>): Promise<z.input<typeof personList>> {
  const matching = db('people').modify((people) => {
    if (query.role) void people.whereRaw('? = any (people.roles)', [query.role]);
    if (query.find) {
      const like = `%${query.find.replace(/[\\%_]/g, '\\$&')}%`;
      void people.where((either) => either.whereILike('people.name', like).orWhereILike('people.email', like));
    }
  });
  const [counted] = await matching.clone().count({ total: '*' });
  const rows: (PersonRow & { tier_name: string | null })[] = await matching
    .leftJoin('memberships', 'memberships.person_id', 'people.id')
    .leftJoin('tiers', 'tiers.id', 'memberships.tier_id')
    .orderBy('people.created_at', 'desc')
    .orderBy('people.id')
    .limit(PAGE_SIZE)
    .offset((query.page - 1) * PAGE_SIZE)
    .select('people.*', 'tiers.name as tier_name');
  return {
    people: rows.map((row) => toPersonView(row, row.tier_name)),
    total: Number(counted?.total ?? 0),
    pageSize: PAGE_SIZE,
  };
}

/** Gives and takes roles; the last admin cannot be taken away. */
export async function changeRoles(
  { db }: AppContext,
  { personId, roles, expected }: { personId: string; roles: Role[]; expected: number },
): Promise<PersonView> {
  return db.transaction(async (trx) => {
    // Holding the admins' rows makes two admins who depose each other do it one after the other.
    const admins = await trx('people').whereRaw(`'admin' = any (roles)`).orderBy('id').forUpdate().select('id');
    const person = await findPerson(trx, personId);
    if (!person) throw personNotFound();
    if (person.version !== expected) throw versionConflict();
    if (!roles.includes('admin') && admins.length === 1 && admins[0]?.id === personId) throw lastAdmin();
    const changed = await updatePerson(trx, personId, { roles: [...new Set(roles)] });
    return toPersonView(changed!, null);
  });
}

function toPersonView(row: PersonRow, tierName: string | null): PersonView {
  return {
    id: row.id,
    name: row.name,
    email: row.email,
    verified: row.verified_at !== null,
    roles: row.roles,
    tierName,
    createdAt: row.created_at.toISOString(),
    version: row.version,
  };
}
