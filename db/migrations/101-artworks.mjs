/** @param {import('knex').Knex} knex */
export async function up(knex) {
  await knex.schema.raw(`
    create table artworks (
      id integer primary key,
      order_id integer not null references orders (id),
      version integer not null check (version >= 1),
      file_name text not null,
      media_type text not null,
      bytes integer not null,
      sha256 text not null,
      uploaded_at text not null,
      uploaded_by integer not null references people (id),
      check_report text check (check_report is null or json_valid(check_report)),
      blocker_ids text not null default '[]' check (json_valid(blocker_ids)),
      warnings integer not null default 0,
      picture_sha256 text,
      unique (order_id, version)
    )`);
}

/** @param {import('knex').Knex} knex */
export async function down(knex) {
  await knex.schema.dropTable('artworks');
}
