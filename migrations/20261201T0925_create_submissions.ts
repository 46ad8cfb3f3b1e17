import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('uploads', (table) => {
    table.increments('id');
    table.text('sha256').notNullable().unique();
    table.integer('byte_count').notNullable();
    table.binary('bytes').notNullable();
    table.text('created_at').notNullable();
    table.check('length(sha256) = 64', undefined, 'uploads_sha256');
  });
  await knex.schema.createTable('submissions', (table) => {
    table.increments('id');
    table.integer('round_id').notNullable().references('rounds.id').onDelete('RESTRICT');
    table.integer('enrolment_id').notNullable().references('enrolments.id').onDelete('RESTRICT');
    table.integer('upload_id').notNullable().references('uploads.id').onDelete('RESTRICT');
    table.text('file_name').notNullable();
    table.text('state').notNullable().checkIn(['submitted', 'superseded']);
    table.text('channel').notNullable().checkIn(['browser', 'token', 'whole-round']);
    table.text('receipt_code').notNullable().unique();
    table.integer('result_count').notNullable();
    table.integer('supersedes_id').references('submissions.id').onDelete('RESTRICT');
    table.integer('user_id').references('users.id').onDelete('SET NULL');
    table.integer('api_token_id').references('api_tokens.id').onDelete('SET NULL');
    table.text('submitted_at').notNullable();
    table.index(['round_id']);
  });
  // At most one submission of a laboratory counts; two uploads at the same moment cannot both win.
  await knex.raw(
    "create unique index submissions_one_current on submissions (enrolment_id) where state = 'submitted'",
  );
  await knex.schema.createTable('results', (table) => {
    table.increments('id');
    table.integer('submission_id').notNullable().references('submissions.id').onDelete('RESTRICT');
    table.integer('round_measurand_id').notNullable().references('round_measurands.id').onDelete('RESTRICT');
    table.integer('replicate').notNullable();
    table.integer('line').notNullable();
    table.text('result_text').notNullable();
    table.text('kind').notNullable().checkIn(['value', 'below', 'above', 'not-measured']);
    table.double('value');
    table.double('own_value');
    table.text('own_unit').notNullable();
    table.text('uncertainty_text').notNullable().defaultTo('');
    table.double('expanded_uncertainty');
    table.double('coverage_factor');
    table.double('loq');
    table.text('method').notNullable().defaultTo('');
    table.text('analysed_on');
    table.text('comment').notNullable().defaultTo('');
    table.unique(['submission_id', 'round_measurand_id', 'replicate']);
    table.check("(kind = 'not-measured') = (value is null)", undefined, 'results_value');
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const table of ['results', 'submissions', 'uploads']) await knex.schema.dropTable(table);
}
