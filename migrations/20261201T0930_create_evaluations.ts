import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('evaluations', (table) => {
    table.increments('id');
    table.integer('round_id').notNullable().references('rounds.id').onDelete('RESTRICT');
    table.integer('version').notNullable();
    table.text('library_version').notNullable();
    table.text('settings_json').notNullable();
    table.text('inputs_json').notNullable();
    table.text('inputs_sha256').notNullable();
    table.integer('created_by').references('users.id').onDelete('RESTRICT');
    table.text('created_at').notNullable();
    table.unique(['round_id', 'version']);
  });
  await knex.schema.createTable('evaluated_measurands', (table) => {
    table.increments('id');
    table.integer('evaluation_id').notNullable().references('evaluations.id').onDelete('RESTRICT');
    table.integer('round_measurand_id').notNullable().references('round_measurands.id').onDelete('RESTRICT');
    table.double('assigned_value');
    table.double('assigned_uncertainty');
    table.double('sigma_pt');
    table.text('score_kind').notNullable();
    table.integer('scored_count').notNullable();
    table.text('body_json').notNullable();
    table.unique(['evaluation_id', 'round_measurand_id']);
  });
  await knex.schema.createTable('scores', (table) => {
    table.increments('id');
    table.integer('evaluation_id').notNullable().references('evaluations.id').onDelete('RESTRICT');
    table.integer('round_measurand_id').notNullable().references('round_measurands.id').onDelete('RESTRICT');
    table.integer('enrolment_id').notNullable().references('enrolments.id').onDelete('RESTRICT');
    table.double('value');
    table.double('score');
    table.text('signal').notNullable().checkIn(['none', 'warning', 'action', 'not-scored']);
    table.unique(['evaluation_id', 'round_measurand_id', 'enrolment_id']);
    table.index(['enrolment_id']);
  });
  await knex.schema.createTable('sign_offs', (table) => {
    table.increments('id');
    table.integer('evaluation_id').notNullable().references('evaluations.id').onDelete('RESTRICT');
    table.integer('user_id').notNullable().references('users.id').onDelete('RESTRICT');
    table.text('decision').notNullable().checkIn(['signed', 'returned']);
    table.text('comment').notNullable().defaultTo('');
    table.text('at').notNullable();
    table.index(['evaluation_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const table of ['sign_offs', 'scores', 'evaluated_measurands', 'evaluations']) {
    await knex.schema.dropTable(table);
  }
}
