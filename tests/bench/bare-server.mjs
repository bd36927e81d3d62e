/* The floor for reading: Express with nothing but indexed queries and the bytes of the answer. */
import express from 'express';
import pg from 'pg';

const pool = new pg.Pool({ connectionString: process.env.DATABASE_URL, max: 10 });
const queries = Number(process.env.QUERIES);
const app = express();
app.disable('x-powered-by');

process.once('message', async (/** @type {{ body: string }} */ { body }) => {
  const { rows } = await pool.query(`
    select (select sid from sessions limit 1) as sid, (select id from people limit 1) as person,
      bound_recipes.edition_id, bound_recipes.slug
    from bound_recipes where bound_recipes.slug = 'whitecap-sour'`);
  const { sid, person, edition_id: edition, slug } = rows[0];
  const asked = [
    () => pool.query('select * from bound_recipes where edition_id = $1 and slug = $2', [edition, slug]),
    () => pool.query('select * from people where id = $1', [person]),
    () => pool.query('select * from sessions where sid = $1', [sid]),
  ].slice(0, queries);
  app.get('/', async (_request, response) => {
    for (const ask of asked) await ask();
    response.type('json').send(body);
  });
  app.listen(Number(process.env.PORT), '127.0.0.1', () => process.send?.('listening'));
});
process.send?.('ready');
