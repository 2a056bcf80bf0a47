/** @param {import('knex').Knex} knex */
export async function up(knex) {
  await knex.schema.raw(`
    create table tokens (
      hash text primary key,
      kind text not null check (kind in ('confirm', 'invitation', 'reset')),
      person_id integer not null references people (id) on delete cascade,
      expires_at text not null,
      created_at text not null,
      used_at text
    )`);
  await knex.schema.raw('create index tokens_by_person on tokens (person_id, kind)');
}

/** @param {import('knex').Knex} knex */
export async function down(knex) {
  await knex.schema.dropTable('tokens');
}
