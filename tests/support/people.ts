import type { Knex } from 'knex';
import type { Role } from '../../shared/contracts/words.ts';
import { hashPassword } from '../../server/people/passwords.ts';
import type { PersonRow } from '../../server/people/people.rows.ts';

/** One password for everybody, hashed once. */
export const PASSWORD = 'a password for tests';
const hashed = hashPassword(PASSWORD);
let counter = 0;

export interface PersonWish {
  roles?: Role[];
  verified?: boolean;
  ageConfirmed?: boolean;
  name?: string;
  email?: string;
}

/** A person, verified and past the age check unless told otherwise. */
export async function makePerson(db: Knex, wish: PersonWish = {}): Promise<PersonRow> {
  counter += 1;
  const [row] = await db('people')
    .insert({
      email: wish.email ?? `person-${counter}-${process.pid}@house.example`,
      name: wish.name ?? `Person ${counter}`,
      password_hash: await hashed,
      roles: wish.roles ?? [],
      verified_at: (wish.verified ?? true) ? new Date() : null,
      age_confirmed_at: (wish.ageConfirmed ?? true) ? new Date() : null,
    })
    .returning('*');
  return row!;
}
