/** @param {import('knex').Knex} knex */
export async function up(knex) {
  await knex.schema.raw(`
    create table shop_washes (
      id integer primary key,
      product text not null,
      ratio text not null,
      drying_minutes integer not null,
      sheet_url text not null,
      changed_at text not null
    )`);
}

/** @param {import('knex').Knex} knex */
export async function down(knex) {
  await knex.schema.dropTable('shop_washes');
}
