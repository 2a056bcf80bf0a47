const STATES = [
  'draft',
  'submitted',
  'in-preparation',
  'passed',
  'proof-sent',
  'approved',
  'released',
  'running',
  'finished',
  'handed-over',
  'on-hold',
  'cancelled',
];
const listed = STATES.map((state) => `'${state}'`).join(', ');

/** @param {import('knex').Knex} knex */
export async function up(knex) {
  // autoincrement: the number of an order follows from its id, and is never given a second time.
  await knex.schema.raw(`
    create table orders (
      id integer primary key autoincrement,
      customer_id integer not null references people (id),
      opened_by integer not null references people (id),
      state text not null check (state in (${listed})),
      former_state text check (former_state in (${listed})),
      version integer not null default 1,
      created_at text not null,
      updated_at text not null,
      submitted_at text,
      title text not null,
      quantity integer not null check (quantity >= 1),
      due_on text,
      width_mm real,
      height_mm real,
      blank text check (blank is null or json_valid(blank)),
      stock_id integer references stocks (id),
      placement text not null check (json_valid(placement)),
      treatment text,
      shade_lstar real,
      route text not null,
      use text not null,
      notes text not null,
      without_proof integer not null check (without_proof in (0, 1)),
      rights_confirmed_at text,
      rights_confirmed_by integer references people (id),
      taken_by integer references people (id),
      design text check (design is null or json_valid(design)),
      machine_id integer references machines (id),
      spot_preset_id integer references spot_presets (id),
      recipe_typed_by text not null default '',
      passed_at text,
      passed_by integer references people (id),
      passed_preparation_id integer references preparations (id),
      passed_manifest_sha256 text,
      approved_at text,
      approved_by text,
      approved_how text,
      approved_manifest_sha256 text,
      held_because text not null default '',
      check ((state = 'on-hold') = (former_state is not null))
    )`);
  await knex.schema.raw('create index orders_by_customer on orders (customer_id)');
  await knex.schema.raw('create index orders_by_state on orders (state, due_on)');
  await knex.schema.raw('create index orders_by_machine on orders (machine_id)');
}

/** @param {import('knex').Knex} knex */
export async function down(knex) {
  await knex.schema.dropTable('orders');
}
