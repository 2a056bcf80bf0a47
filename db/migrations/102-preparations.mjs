/** @param {import('knex').Knex} knex */
export async function up(knex) {
  await knex.schema.raw(`
    create table preparations (
      id integer primary key,
      order_id integer not null references orders (id),
      artwork_id integer not null references artworks (id),
      key text not null,
      design text not null check (json_valid(design)),
      settings text not null check (json_valid(settings)),
      started_by integer not null references people (id),
      started_at text not null,
      finished_at text,
      manifest text check (manifest is null or json_valid(manifest)),
      manifest_sha256 text,
      report text check (report is null or json_valid(report)),
      pictures text not null default '{}' check (json_valid(pictures)),
      timings text not null default '{}' check (json_valid(timings)),
      total_seconds real,
      unique (order_id, key)
    )`);
  await knex.schema.raw(`
    create table prepared_files (
      preparation_id integer not null references preparations (id),
      name text not null,
      role text not null check (role in ('raster', 'linework')),
      media_type text not null,
      bytes integer not null,
      sha256 text not null,
      primary key (preparation_id, name)
    )`);
}

/** @param {import('knex').Knex} knex */
export async function down(knex) {
  await knex.schema.dropTable('prepared_files');
  await knex.schema.dropTable('preparations');
}
