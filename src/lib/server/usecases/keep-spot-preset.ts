import type { SpotPreset } from '../../machines/machine';
import type { MachineView } from '../../orders/views';
import { audit } from '../audit';
import { refuseOn } from '../constraint';
import { withWrite } from '../db';
import { AppError } from '../errors';
import type { Person } from '../person';
import { deleteSpotPreset, insertSpotPreset, updateSpotPreset } from '../tables/machines';
import { requireMachine } from './keep-machine';

const inWords = ({ name, widthMm, heightMm, shape }: SpotPreset): string =>
  `${name}: ${widthMm} x ${heightMm} mm, ${shape}`;

export async function addSpotPreset(by: Person, machineId: number, preset: SpotPreset): Promise<MachineView> {
  return withWrite(async (trx) => {
    await requireMachine(trx, machineId);
    await refuseOn('SQLITE_CONSTRAINT_UNIQUE', 'name-taken', () => insertSpotPreset(trx, machineId, preset));
    await audit(trx, {
      by,
      event: 'add-spot-preset',
      subject: `machine ${machineId}`,
      words: inWords(preset),
    });
    return requireMachine(trx, machineId);
  });
}

export async function changeSpotPreset(
  by: Person,
  machineId: number,
  id: number,
  preset: SpotPreset,
): Promise<MachineView> {
  return withWrite(async (trx) => {
    const found = await refuseOn('SQLITE_CONSTRAINT_UNIQUE', 'name-taken', () =>
      updateSpotPreset(trx, machineId, id, preset),
    );
    if (!found) throw new AppError('not-found');
    await audit(trx, {
      by,
      event: 'change-spot-preset',
      subject: `machine ${machineId}`,
      words: inWords(preset),
    });
    return requireMachine(trx, machineId);
  });
}

/** Removes a preset that no order refers to; the database itself keeps one that is in use. */
export async function removeSpotPreset(by: Person, machineId: number, id: number): Promise<MachineView> {
  return withWrite(async (trx) => {
    const preset = (await requireMachine(trx, machineId)).spotPresets.find(
      (candidate) => candidate.id === id,
    );
    if (!preset) throw new AppError('not-found');
    await refuseOn('SQLITE_CONSTRAINT_FOREIGNKEY', 'preset-in-use', () =>
      deleteSpotPreset(trx, machineId, id),
    );
    await audit(trx, {
      by,
      event: 'remove-spot-preset',
      subject: `machine ${machineId}`,
      words: inWords(preset),
    });
    return requireMachine(trx, machineId);
  });
}
