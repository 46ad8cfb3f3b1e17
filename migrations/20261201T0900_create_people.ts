import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('laboratories', (table) => {
    table.increments('id');
    table.text('name').notNullable().unique();
    table.text('kind').notNullable().defaultTo('other');
    table.text('town').notNullable().defaultTo('');
    table.text('contact_email');
    table.boolean('is_active').notNullable().defaultTo(true).checkIn(['0', '1']);
    table.text('created_at').notNullable();
  });
  await knex.schema.createTable('users', (table) => {
    table.increments('id');
    table.text('email').notNullable().unique();
    table.text('name').notNullable();
    table.text('password_hash');
    table.boolean('is_disabled').notNullable().defaultTo(false).checkIn(['0', '1']);
    table.text('created_at').notNullable();
    table.check('email = lower(email)', undefined, 'users_email_lower');
  });
  await knex.schema.createTable('memberships', (table) => {
    table.increments('id');
    table.integer('user_id').notNullable().references('users.id').onDelete('RESTRICT');
    table.integer('laboratory_id').references('laboratories.id').onDelete('RESTRICT');
    table.text('role').notNullable();
    table.text('created_at').notNullable();
    table.unique(['user_id', 'laboratory_id', 'role']);
    table.check(
      "(role in ('administrator', 'coordinator', 'reviewer') and laboratory_id is null) or (role in ('lab_manager', 'analyst') and laboratory_id is not null)",
      undefined,
      'memberships_role_place',
    );
    table.index(['laboratory_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const table of ['memberships', 'users', 'laboratories']) await knex.schema.dropTable(table);
}
