import type { Knex } from 'knex';

const SIGMA_RULES = ['prescribed', 'percent', 'horwitz', 'horwitz-thompson', 'robust-sd'];

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('rounds', (table) => {
    table.increments('id');
    table.text('slug').notNullable().unique();
    table.integer('scheme_id').notNullable().references('schemes.id').onDelete('RESTRICT');
    table.text('name').notNullable();
    table
      .text('state')
      .notNullable()
      .checkIn(['draft', 'open', 'closed', 'evaluated', 'published', 'cancelled']);
    table.boolean('is_past').notNullable().defaultTo(false).checkIn(['0', '1']);
    table.text('opens_at').notNullable();
    table.text('dispatch_at').notNullable();
    table.text('closes_at').notNullable();
    table.text('publish_at').notNullable();
    table.text('instructions').notNullable().defaultTo('');
    table.integer('fee_cents').notNullable().defaultTo(0);
    table.text('fee_currency').notNullable().defaultTo('EUR');
    table.text('opened_at');
    table.text('closed_at');
    table.text('evaluated_at');
    table.text('published_at');
    table.text('cancelled_at');
    table.text('cancel_reason');
    table.integer('created_by').references('users.id').onDelete('SET NULL');
    table.text('created_at').notNullable();
    table.check('fee_cents >= 0', undefined, 'rounds_fee');
    table.check('opens_at <= closes_at and closes_at <= publish_at', undefined, 'rounds_dates');
    table.index(['scheme_id']);
    table.index(['state']);
  });
  await knex.schema.createTable('test_items', (table) => {
    table.increments('id');
    table.integer('round_id').notNullable().references('rounds.id').onDelete('CASCADE');
    table.text('code').notNullable();
    table.text('name').notNullable();
    table.text('matrix').notNullable().defaultTo('');
    table.text('handling').notNullable().defaultTo('');
    table.integer('position').notNullable();
    table.unique(['round_id', 'code']);
  });
  await knex.schema.createTable('round_measurands', (table) => {
    table.increments('id');
    table.integer('round_id').notNullable().references('rounds.id').onDelete('CASCADE');
    table.integer('test_item_id').notNullable().references('test_items.id').onDelete('CASCADE');
    table.integer('measurand_id').notNullable().references('measurands.id').onDelete('RESTRICT');
    table.integer('replicates').notNullable().defaultTo(1).checkBetween([1, 10]);
    table.text('assigned_method').notNullable().checkIn(['algorithm-a', 'median', 'mean', 'stated']);
    table.double('stated_value');
    table.double('stated_uncertainty');
    table.text('stated_source');
    table.text('sigma_rule').notNullable().checkIn(SIGMA_RULES);
    table.double('sigma_value');
    table.double('sigma_percent');
    table.text('score_kind').notNullable().checkIn(['z', 'z-prime', 'zeta', 'e-n']);
    table.boolean('z_prime_when_needed').notNullable().defaultTo(true).checkIn(['0', '1']);
    table.integer('position').notNullable();
    table.unique(['test_item_id', 'measurand_id']);
    table.check('sigma_value is null or sigma_value > 0', undefined, 'round_measurands_sigma_value');
    table.check('sigma_percent is null or sigma_percent > 0', undefined, 'round_measurands_sigma_percent');
    table.check(
      "assigned_method <> 'stated' or stated_value is not null",
      undefined,
      'round_measurands_stated',
    );
    table.index(['round_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const table of ['round_measurands', 'test_items', 'rounds']) await knex.schema.dropTable(table);
}
