/** @param {import('knex').Knex} knex */
export async function up(knex) {
  await knex.schema.raw(`
    create table sessions (
      id text primary key,
      person_id integer not null references people (id) on delete cascade,
      created_at text not null,
      expires_at text not null
    )`);
  await knex.schema.raw('create index sessions_by_person on sessions (person_id)');
}

/** @param {import('knex').Knex} knex */
export async function down(knex) {
  await knex.schema.dropTable('sessions');
}
