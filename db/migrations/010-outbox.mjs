/** @param {import('knex').Knex} knex */
export async function up(knex) {
  await knex.schema.raw(`
    create table outbox (
      id integer primary key,
      message_id text not null unique,
      received_at text not null,
      sender text not null,
      recipient text not null,
      subject text not null,
      text text not null,
      html text not null
    )`);
}

/** @param {import('knex').Knex} knex */
export async function down(knex) {
  await knex.schema.dropTable('outbox');
}
