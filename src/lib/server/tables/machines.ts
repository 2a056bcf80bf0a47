import type { Machine, SpotPreset } from '../../machines/machine';
import { powerPointSchema } from '../../machines/machine';
import type { MachineView } from '../../orders/views';
import type { Db } from '../db';
import { decode } from './json-column';

interface MachineRow {
  id: number;
  name: string;
  bed_width_mm: number;
  bed_height_mm: number;
  max_speed_mm_per_s: number;
  acceleration_mm_per_s2: number;
  watts_at_full: number;
  power_curve: string;
  lasing_threshold_percent: number;
  power_levels: number;
  speed_unit: Machine['speedUnit'];
  firing: Machine['firing'];
  scanning: Machine['scanning'];
  retired_at: string | null;
}

interface SpotPresetRow {
  id: number;
  machine_id: number;
  name: string;
  width_mm: number;
  height_mm: number;
  shape: SpotPreset['shape'];
  measured_by: SpotPreset['measuredBy'];
  measured_at_dose_j_per_mm2: number | null;
}

function columns(machine: Machine): Omit<MachineRow, 'id' | 'retired_at'> {
  return {
    name: machine.name,
    bed_width_mm: machine.bedWidthMm,
    bed_height_mm: machine.bedHeightMm,
    max_speed_mm_per_s: machine.maxSpeedMmPerS,
    acceleration_mm_per_s2: machine.accelerationMmPerS2,
    watts_at_full: machine.wattsAtFull,
    power_curve: JSON.stringify(machine.powerCurve),
    lasing_threshold_percent: machine.lasingThresholdPercent,
    power_levels: machine.powerLevels,
    speed_unit: machine.speedUnit,
    firing: machine.firing,
    scanning: machine.scanning,
  };
}

function presetColumns(preset: SpotPreset): Omit<SpotPresetRow, 'id' | 'machine_id'> {
  return {
    name: preset.name,
    width_mm: preset.widthMm,
    height_mm: preset.heightMm,
    shape: preset.shape,
    measured_by: preset.measuredBy,
    measured_at_dose_j_per_mm2: preset.measuredAtDoseJPerMm2,
  };
}

const presetView = (row: SpotPresetRow): MachineView['spotPresets'][number] => ({
  id: row.id,
  name: row.name,
  widthMm: row.width_mm,
  heightMm: row.height_mm,
  shape: row.shape,
  measuredBy: row.measured_by,
  measuredAtDoseJPerMm2: row.measured_at_dose_j_per_mm2,
});

const view = (row: MachineRow, presets: SpotPresetRow[]): MachineView => ({
  id: row.id,
  name: row.name,
  bedWidthMm: row.bed_width_mm,
  bedHeightMm: row.bed_height_mm,
  maxSpeedMmPerS: row.max_speed_mm_per_s,
  accelerationMmPerS2: row.acceleration_mm_per_s2,
  wattsAtFull: row.watts_at_full,
  powerCurve: decode(powerPointSchema.array(), row.power_curve),
  lasingThresholdPercent: row.lasing_threshold_percent,
  powerLevels: row.power_levels,
  speedUnit: row.speed_unit,
  firing: row.firing,
  scanning: row.scanning,
  retired: row.retired_at !== null,
  spotPresets: presets.filter((preset) => preset.machine_id === row.id).map(presetView),
});

/** Machines with their spot presets, those in service first. */
export async function allMachines(db: Db): Promise<MachineView[]> {
  const rows = await db<MachineRow>('machines').orderByRaw('retired_at is not null, name collate nocase');
  const presets = await db<SpotPresetRow>('spot_presets').orderBy('id');
  return rows.map((row) => view(row, presets));
}

export async function machineById(db: Db, id: number): Promise<MachineView | null> {
  const row = await db<MachineRow>('machines').where({ id }).first();
  return row
    ? view(row, await db<SpotPresetRow>('spot_presets').where({ machine_id: id }).orderBy('id'))
    : null;
}

export async function insertMachine(db: Db, machine: Machine): Promise<number> {
  const [id] = await db('machines').insert(columns(machine));
  return id;
}

export async function updateMachine(
  db: Db,
  id: number,
  machine: Machine,
  retiredAt: string | null,
): Promise<void> {
  await db('machines')
    .where({ id })
    .update({ ...columns(machine), retired_at: retiredAt });
}

export async function insertSpotPreset(db: Db, machineId: number, preset: SpotPreset): Promise<number> {
  const [id] = await db('spot_presets').insert({ machine_id: machineId, ...presetColumns(preset) });
  return id;
}

/** False when the machine has no such preset. */
export async function updateSpotPreset(
  db: Db,
  machineId: number,
  id: number,
  preset: SpotPreset,
): Promise<boolean> {
  return (await db('spot_presets').where({ id, machine_id: machineId }).update(presetColumns(preset))) === 1;
}

/** False when the machine has no such preset. */
export async function deleteSpotPreset(db: Db, machineId: number, id: number): Promise<boolean> {
  return (await db('spot_presets').where({ id, machine_id: machineId }).delete()) === 1;
}
