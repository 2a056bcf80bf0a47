/** @param {import('knex').Knex} knex */
export async function up(knex) {
  await knex.schema.raw(`
    create table people (
      id integer primary key,
      email text not null unique collate nocase,
      name text not null,
      role text not null check (role in ('customer', 'designer', 'operator', 'admin')),
      password_hash text,
      confirmed_at text,
      disabled_at text,
      token_version integer not null default 1,
      created_at text not null
    )`);
}

/** @param {import('knex').Knex} knex */
export async function down(knex) {
  await knex.schema.dropTable('people');
}
