import type { MachineView } from '../../orders/views';
import { database } from '../db';
import { allMachines } from '../tables/machines';

export const listMachines = (): Promise<MachineView[]> => allMachines(database());
