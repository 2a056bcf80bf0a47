/** @param {import('knex').Knex} knex */
export async function up(knex) {
  // 0 is no person's version: sessions from before end.
  await knex.schema.raw('alter table sessions add column token_version integer not null default 0');
}

/** @param {import('knex').Knex} knex */
export async function down(knex) {
  await knex.schema.raw('alter table sessions drop column token_version');
}
