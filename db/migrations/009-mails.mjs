/** @param {import('knex').Knex} knex */
export async function up(knex) {
  await knex.schema.raw(`
    create table mails (
      id integer primary key,
      message_id text not null unique,
      kind text not null,
      recipient text not null collate nocase,
      subject text not null,
      text text not null,
      html text not null,
      attempts integer not null default 0,
      due_at text not null,
      sent_at text,
      failed_at text,
      problem text not null default '',
      created_at text not null
    )`);
  await knex.schema.raw(
    'create index mails_waiting on mails (due_at) where sent_at is null and failed_at is null',
  );
}

/** @param {import('knex').Knex} knex */
export async function down(knex) {
  await knex.schema.dropTable('mails');
}
