/** @param {import('knex').Knex} knex */
export async function up(knex) {
  await knex.schema.raw(`
    create table outcomes (
      id integer primary key,
      order_id integer not null references orders (id),
      at text not null,
      recorded_by integer not null references people (id),
      kind text not null check (kind in ('done', 'spoiled')),
      words text not null,
      measured_lstar real,
      new_blank text not null default '',
      cost text not null default ''
    )`);
  await knex.schema.raw('create index outcomes_by_order on outcomes (order_id)');
}

/** @param {import('knex').Knex} knex */
export async function down(knex) {
  await knex.schema.dropTable('outcomes');
}
