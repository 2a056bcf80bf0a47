import { machineSchema, type Machine } from '../../machines/machine';
import type { MachineView } from '../../orders/views';
import { audit } from '../audit';
import { refuseOn } from '../constraint';
import { withWrite, type Transaction } from '../db';
import { AppError } from '../errors';
import type { Person } from '../person';
import { insertMachine, machineById, updateMachine } from '../tables/machines';

export async function requireMachine(trx: Transaction, id: number): Promise<MachineView> {
  const machine = await machineById(trx, id);
  if (!machine) throw new AppError('not-found');
  return machine;
}

export async function addMachine(by: Person, machine: Machine): Promise<MachineView> {
  return withWrite(async (trx) => {
    const id = await refuseOn('SQLITE_CONSTRAINT_UNIQUE', 'name-taken', () => insertMachine(trx, machine));
    await audit(trx, { by, event: 'add-machine', subject: `machine ${id}`, words: machine.name });
    return requireMachine(trx, id);
  });
}

/** Changes a machine, or takes it out of service; what was prepared for it keeps the figures it was prepared with. */
export async function changeMachine(
  by: Person,
  id: number,
  change: Partial<Machine> & { retired?: boolean },
): Promise<MachineView> {
  return withWrite(async (trx) => {
    const before = await requireMachine(trx, id);
    const { retired = before.retired, ...changed } = { ...before, ...change };
    const machine = machineSchema.parse(changed);
    await refuseOn('SQLITE_CONSTRAINT_UNIQUE', 'name-taken', () =>
      updateMachine(trx, id, machine, retired ? new Date().toISOString() : null),
    );
    const event =
      retired === before.retired ? 'change-machine' : retired ? 'retire-machine' : 'bring-machine-back';
    await audit(trx, {
      by,
      event,
      subject: `machine ${id}`,
      words: `${machine.name}: ${Object.keys(change).join(', ')}`,
    });
    return requireMachine(trx, id);
  });
}
