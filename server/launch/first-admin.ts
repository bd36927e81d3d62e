import { createInterface } from 'node:readline/promises';
import { openDatabase } from '../db/connection.ts';
import { insertPerson } from '../people/people.queries.ts';
import { hashPassword } from '../people/passwords.ts';
import { registration } from '../../shared/contracts/people.ts';

/** Makes the first admin: `npm run first-admin -- EMAIL NAME`, the password typed or piped in on one line. */
async function main(): Promise<void> {
  const url = process.env.DATABASE_URL;
  if (!url) throw new Error('DATABASE_URL says which database the admin belongs to.');
  const [email, ...name] = process.argv.slice(2);
  const lines = createInterface({ input: process.stdin, output: process.stderr });
  const password = await lines.question('Password of at least 10 characters: ');
  lines.close();
  const result = registration.safeParse({ email, name: name.join(' '), password });
  if (!result.success)
    throw new Error(result.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`).join('\n'));

  const db = openDatabase(url);
  try {
    const admins = await db('people').whereRaw(`'admin' = any (roles)`).first('id');
    if (admins) throw new Error('There is an admin already; roles are given on the people page.');
    await insertPerson(db, {
      email: result.data.email,
      name: result.data.name,
      password_hash: await hashPassword(result.data.password),
      verified_at: new Date(),
      roles: ['admin'],
    });
    process.stderr.write(`${result.data.email} is the first admin.\n`);
  } finally {
    await db.destroy();
  }
}

main().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
});
