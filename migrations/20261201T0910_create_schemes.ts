import type { Knex } from 'knex';

const SIGMA_RULES = ['prescribed', 'percent', 'horwitz', 'horwitz-thompson', 'robust-sd'];

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('schemes', (table) => {
    table.increments('id');
    table.text('slug').notNullable().unique();
    table.text('name').notNullable();
    table.text('description').notNullable().defaultTo('');
    table.integer('created_by').references('users.id').onDelete('SET NULL');
    table.text('created_at').notNullable();
  });
  await knex.schema.createTable('measurands', (table) => {
    table.increments('id');
    table.integer('scheme_id').notNullable().references('schemes.id').onDelete('RESTRICT');
    table.text('code').notNullable();
    table.text('name').notNullable();
    table.text('unit').notNullable();
    table.integer('decimals').notNullable().checkBetween([0, 8]);
    table.double('decision_limit');
    table.text('decision_limit_source');
    table.text('sigma_rule').notNullable().checkIn(SIGMA_RULES);
    table.double('sigma_value');
    table.double('sigma_percent');
    table.integer('position').notNullable();
    table.unique(['scheme_id', 'code']);
    table.check('sigma_value is null or sigma_value > 0', undefined, 'measurands_sigma_value');
    table.check('sigma_percent is null or sigma_percent > 0', undefined, 'measurands_sigma_percent');
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('measurands');
  await knex.schema.dropTable('schemes');
}
