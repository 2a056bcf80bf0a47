/** @param {import('knex').Knex} knex */
export async function up(knex) {
  await knex.schema.raw(`
    create table waivers (
      id integer primary key,
      order_id integer not null references orders (id),
      artwork_version integer not null,
      finding_id text not null,
      reason text not null,
      waived_by integer not null references people (id),
      waived_at text not null,
      unique (order_id, artwork_version, finding_id)
    )`);
}

/** @param {import('knex').Knex} knex */
export async function down(knex) {
  await knex.schema.dropTable('waivers');
}
