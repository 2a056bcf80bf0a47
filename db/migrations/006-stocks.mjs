/** @param {import('knex').Knex} knex */
export async function up(knex) {
  await knex.schema.raw(`
    create table stocks (
      id integer primary key,
      name text not null unique collate nocase,
      species text not null,
      thickness_mm real not null,
      finish text not null,
      direction text not null check (direction in ('darkens', 'lightens')),
      ground_colour text not null,
      ground_lstar real not null,
      mark_colour text not null,
      mark_lstar real not null,
      cautions text not null default '[]' check (json_valid(cautions)),
      forbidden integer not null default 0 check (forbidden in (0, 1)),
      routes text not null default '[]' check (json_valid(routes)),
      notes text not null default '',
      retired_at text
    )`);
}

/** @param {import('knex').Knex} knex */
export async function down(knex) {
  await knex.schema.dropTable('stocks');
}
