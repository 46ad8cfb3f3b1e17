import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('enrolments', (table) => {
    table.increments('id');
    table.integer('round_id').notNullable().references('rounds.id').onDelete('RESTRICT');
    table.integer('laboratory_id').notNullable().references('laboratories.id').onDelete('RESTRICT');
    table.text('participant_code').notNullable();
    table.text('state').notNullable().checkIn(['invited', 'enrolled', 'declined', 'withdrawn']);
    table.text('reason').notNullable().defaultTo('');
    table.text('items_received_at');
    table.text('created_at').notNullable();
    table.text('decided_at');
    table.unique(['round_id', 'laboratory_id']);
    table.unique(['round_id', 'participant_code']);
    table.index(['laboratory_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('enrolments');
}
