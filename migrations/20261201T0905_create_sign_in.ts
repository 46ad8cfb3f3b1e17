import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('sessions', (table) => {
    table.text('id').primary();
    table.integer('user_id').notNullable().references('users.id').onDelete('CASCADE');
    table.integer('laboratory_id').references('laboratories.id').onDelete('SET NULL');
    table.text('created_at').notNullable();
    table.text('expires_at').notNullable();
    table.text('ended_at');
    table.index(['user_id']);
  });
  await knex.schema.createTable('one_time_links', (table) => {
    table.increments('id');
    table.integer('user_id').notNullable().references('users.id').onDelete('CASCADE');
    table.text('purpose').notNullable().checkIn(['welcome', 'reset']);
    table.text('token_hash').notNullable().unique();
    table.text('created_at').notNullable();
    table.text('expires_at').notNullable();
    table.text('used_at');
  });
  await knex.schema.createTable('sign_in_attempts', (table) => {
    table.increments('id');
    table.text('email').notNullable();
    table.text('at').notNullable();
    table.boolean('succeeded').notNullable().checkIn(['0', '1']);
    table.index(['email', 'at']);
  });
  await knex.schema.createTable('api_tokens', (table) => {
    table.increments('id');
    table.integer('laboratory_id').notNullable().references('laboratories.id').onDelete('RESTRICT');
    table.text('name').notNullable();
    table.text('token_hash').notNullable().unique();
    table.text('last_four').notNullable();
    table.integer('created_by').references('users.id').onDelete('SET NULL');
    table.text('created_at').notNullable();
    table.text('expires_at').notNullable();
    table.text('revoked_at');
    table.text('last_used_at');
    table.index(['laboratory_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const table of ['api_tokens', 'sign_in_attempts', 'one_time_links', 'sessions']) {
    await knex.schema.dropTable(table);
  }
}
