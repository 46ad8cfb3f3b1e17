import type { Knex } from 'knex';

const FROZEN = [
  'evaluations',
  'evaluated_measurands',
  'scores',
  'sign_offs',
  'audit_log',
  'uploads',
  'results',
];

function isSqlite(knex: Knex): boolean {
  return String(knex.client.config.client).includes('sqlite');
}

/** Rows of these tables are written once. Another database client must bring its own triggers. */
export async function up(knex: Knex): Promise<void> {
  if (!isSqlite(knex)) throw new Error('freeze_records: write the triggers for this database client first');
  for (const table of FROZEN) {
    for (const verb of ['update', 'delete']) {
      await knex.raw(
        `create trigger ${table}_no_${verb} before ${verb} on ${table} begin select raise(abort, '${table} is written once: no ${verb}'); end`,
      );
    }
  }
}

export async function down(knex: Knex): Promise<void> {
  for (const table of FROZEN) {
    for (const verb of ['update', 'delete']) await knex.raw(`drop trigger ${table}_no_${verb}`);
  }
}
