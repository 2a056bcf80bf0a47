/** @param {import('knex').Knex} knex */
export async function up(knex) {
  await knex.schema.raw(`
    create table tasks (
      id integer primary key,
      name text not null,
      subject text not null,
      order_id integer references orders (id),
      payload text not null check (json_valid(payload)),
      state text not null check (state in ('waiting', 'running', 'done', 'failed', 'superseded')),
      attempt integer not null default 0,
      failures integer not null default 0,
      due_ms integer not null,
      lease_until_ms integer,
      stage text not null default '',
      progress real not null default 0,
      problem text not null default '',
      created_at text not null,
      finished_at text
    )`);
  // At most one task of a name is open for a subject, whoever asks twice.
  await knex.schema.raw(`
    create unique index tasks_open on tasks (name, subject) where state in ('waiting', 'running')`);
  await knex.schema.raw(`create index tasks_due on tasks (due_ms) where state in ('waiting', 'running')`);
  await knex.schema.raw('create index tasks_by_subject on tasks (subject, id)');
  await knex.schema.raw('create index tasks_by_order on tasks (order_id, id)');
}

/** @param {import('knex').Knex} knex */
export async function down(knex) {
  await knex.schema.dropTable('tasks');
}
