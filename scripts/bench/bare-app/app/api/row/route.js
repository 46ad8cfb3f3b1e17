import path from 'node:path';
import knex from 'knex';

export const dynamic = 'force-dynamic';

let connection;

/** One connection with the settings of the application's own, and a table of one row. */
async function open() {
  const filename = path.join(/* turbopackIgnore: true */ process.env.ASSIZE_DATA_DIR, 'bare.sqlite');
  const made = knex({
    client: 'better-sqlite3',
    connection: { filename },
    useNullAsDefault: true,
    pool: {
      min: 1,
      max: 1,
      afterCreate(raw, done) {
        raw.pragma('journal_mode = WAL');
        done(null, raw);
      },
    },
  });
  await made.schema.dropTableIfExists('things');
  await made.schema.createTable('things', (table) => {
    table.increments('id');
    table.text('name').notNullable();
  });
  await made('things').insert({ name: 'one' });
  return made;
}

export async function GET() {
  connection ??= open();
  const row = await (await connection)('things').where({ id: 1 }).first();
  return Response.json(row);
}
