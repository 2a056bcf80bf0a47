/** @param {import('knex').Knex} knex */
export async function up(knex) {
  // autoincrement: an old preparation names its preset by id, which no later preset may take over.
  await knex.schema.raw(`
    create table spot_presets (
      id integer primary key autoincrement,
      machine_id integer not null references machines (id) on delete cascade,
      name text not null collate nocase,
      width_mm real not null,
      height_mm real not null,
      shape text not null check (shape in ('ellipse', 'rectangle')),
      measured_by text not null check (measured_by in ('burned-line', 'maker', 'beam-1e2', 'beam-4sigma')),
      measured_at_dose_j_per_mm2 real,
      unique (machine_id, name)
    )`);
}

/** @param {import('knex').Knex} knex */
export async function down(knex) {
  await knex.schema.dropTable('spot_presets');
}
