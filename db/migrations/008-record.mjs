/** @param {import('knex').Knex} knex */
export async function up(knex) {
  await knex.schema.raw(`
    create table record (
      id integer primary key,
      at text not null,
      person_id integer references people (id),
      by text not null,
      event text not null,
      subject text not null,
      from_state text,
      to_state text,
      words text not null default ''
    )`);
  await knex.schema.raw('create index record_by_subject on record (subject, id)');
  // What happened stays as it was written.
  for (const verb of ['update', 'delete']) {
    await knex.schema.raw(`
      create trigger record_no_${verb} before ${verb} on record
      begin select raise(abort, 'the record is only ever added to'); end`);
  }
}

/** @param {import('knex').Knex} knex */
export async function down(knex) {
  await knex.schema.dropTable('record');
}
