import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('audit_log', (table) => {
    table.increments('id');
    table.text('at').notNullable();
    table.integer('user_id').references('users.id').onDelete('RESTRICT');
    table.integer('api_token_id').references('api_tokens.id').onDelete('RESTRICT');
    table.integer('laboratory_id').references('laboratories.id').onDelete('RESTRICT');
    table.integer('round_id').references('rounds.id').onDelete('RESTRICT');
    table.text('action').notNullable();
    table.text('outcome').notNullable().checkIn(['done', 'refused']);
    table.text('detail').notNullable().defaultTo('');
    table.index(['round_id', 'id']);
  });
  await knex.schema.createTable('outbox', (table) => {
    table.increments('id');
    table.text('dedupe_key').notNullable().unique();
    table.text('to_address').notNullable();
    table.text('subject').notNullable();
    table.text('body').notNullable();
    table.text('state').notNullable().checkIn(['waiting', 'sent', 'failed']);
    table.integer('attempts').notNullable().defaultTo(0);
    table.text('last_error').notNullable().defaultTo('');
    table.text('created_at').notNullable();
    table.text('next_attempt_at').notNullable();
    table.text('sent_at');
    table.index(['state', 'next_attempt_at']);
  });
  await knex.schema.createTable('settings', (table) => {
    table.text('key').primary();
    table.text('value').notNullable();
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const table of ['settings', 'outbox', 'audit_log']) await knex.schema.dropTable(table);
}
