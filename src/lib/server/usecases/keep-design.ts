import { nextState } from '../../orders/state';
import type { Design, MachineView, OrderView } from '../../orders/views';
import { audit } from '../audit';
import { withWrite, type Transaction } from '../db';
import { AppError } from '../errors';
import { askForCheck } from '../orders/ask-for-check';
import { findUnchangedOrder } from '../orders/find-order';
import { viewAfter } from '../orders/move-order';
import type { Person } from '../person';
import { machineById } from '../tables/machines';
import { changeOrder, designOf } from '../tables/orders';

function refuseUnfit(design: Design, machine: MachineView): void {
  const fields: Record<string, string> = {};
  const { recipe } = design;
  if (!machine.spotPresets.some(({ id }) => id === design.spotPresetId)) {
    fields.spotPresetId = `${machine.name} has no such spot preset.`;
  }
  const fastest = Math.max(recipe?.speedMmPerS ?? 0, recipe?.perpendicular?.speedMmPerS ?? 0);
  if (fastest > machine.maxSpeedMmPerS) {
    fields['recipe.speedMmPerS'] = `${machine.name} runs at ${machine.maxSpeedMmPerS} mm/s at most.`;
  }
  if (recipe && design.perpendicular && !recipe.perpendicular) {
    fields['recipe.perpendicular'] = 'The perpendicular pass has power and speed of its own.';
  }
  if (design.tone.blackPoint >= design.tone.whitePoint)
    fields['tone.blackPoint'] = 'The black point lies below the white point.';
  if (Object.keys(fields).length > 0) throw new AppError('malformed', { fields });
}

async function requireMachine(trx: Transaction, design: Design): Promise<MachineView> {
  const machine = await machineById(trx, design.machineId);
  if (!machine || machine.retired)
    throw new AppError('malformed', { fields: { machineId: 'The shop has no such machine.' } });
  return machine;
}

/** What a check depends on: another spot or scan gives other limits. */
const checked = (design: Design | null): string =>
  JSON.stringify(
    design && [design.machineId, design.spotPresetId, design.scan, design.treatment, design.dividingLstar],
  );

const keys = (design: Design): (keyof Design)[] => Object.keys(design) as (keyof Design)[];

const CHOICE_WORDS: Record<keyof Design, string> = {
  machineId: 'machine',
  spotPresetId: 'spot',
  treatment: 'treatment',
  screen: 'screen',
  scan: 'line pitch and direction',
  perpendicular: 'passes',
  tone: 'tone',
  dividingLstar: 'dividing level',
  corners: 'corners',
  mirror: 'mirror',
  recipe: 'power, speed and focus',
};

/** Which choices differ, for the record. */
const changedWords = (before: Design | null, after: Design): string =>
  keys(after)
    .filter((key) => !before || JSON.stringify(before[key]) !== JSON.stringify(after[key]))
    .map((key) => CHOICE_WORDS[key])
    .join(', ');

/** Keeps the designer’s choices; a pass holds for what was prepared until it is prepared again. */
export async function keepDesign(
  person: Person,
  number: string,
  version: number,
  design: Design,
): Promise<OrderView> {
  return withWrite(async (trx) => {
    const row = await findUnchangedOrder(trx, person, number, version);
    const open = row.state === 'submitted' || nextState(row.state, 'prepare-again', person.role) !== null;
    if (!open) throw new AppError('not-now', { detail: `The order is ${row.state.replaceAll('-', ' ')}.` });
    refuseUnfit(design, await requireMachine(trx, design));
    const before = designOf(row);
    const retyped = JSON.stringify(before?.recipe ?? null) !== JSON.stringify(design.recipe);
    const change = {
      design: JSON.stringify(design),
      machine_id: design.machineId,
      spot_preset_id: design.spotPresetId,
      recipe_typed_by: retyped ? person.name : row.recipe_typed_by,
    };
    if (!(await changeOrder(trx, row, change))) throw new AppError('conflict');
    await audit(trx, { by: person, event: 'design', subject: number, words: changedWords(before, design) });
    if (checked(before) !== checked(design)) await askForCheck(trx, row.id, 'settled');
    return viewAfter(trx, row.id, person);
  });
}
