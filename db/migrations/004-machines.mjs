/** @param {import('knex').Knex} knex */
export async function up(knex) {
  await knex.schema.raw(`
    create table machines (
      id integer primary key,
      name text not null unique collate nocase,
      bed_width_mm real not null,
      bed_height_mm real not null,
      max_speed_mm_per_s real not null,
      acceleration_mm_per_s2 real not null,
      watts_at_full real not null,
      power_curve text not null default '[]' check (json_valid(power_curve)),
      lasing_threshold_percent real not null,
      power_levels integer not null,
      speed_unit text not null check (speed_unit in ('mm/s', 'mm/min')),
      firing text not null check (firing in ('pulsed', 'swept')),
      scanning text not null check (scanning in ('one-way', 'two-way')),
      retired_at text
    )`);
}

/** @param {import('knex').Knex} knex */
export async function down(knex) {
  await knex.schema.dropTable('machines');
}
