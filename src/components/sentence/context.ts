import type { SentenceContext } from '@/lib/orders/sentence';
import type { Design, MachineView, OrderView } from '@/lib/orders/views';
import { placedSize } from '@/lib/orders/settings';
import type { Spot } from '@/lib/machines/spot';

/** What the choices are drawn and reckoned from. */
export interface ChoiceContext extends SentenceContext {
  machines: readonly MachineView[];
  machine: MachineView | null;
  widthMm: number | null;
  heightMm: number | null;
}

/** What every choice is given. `onChange` takes only what the server will take. */
export interface ChoiceProps {
  design: Design;
  context: ChoiceContext;
  onChange: (design: Design) => void;
}

const NO_SPOT: Spot = { widthMm: 0.1, heightMm: 0.1, shape: 'ellipse' };

export function choiceContext(
  design: Pick<Design, 'machineId' | 'spotPresetId'>,
  machines: readonly MachineView[],
  order: Pick<OrderView, 'fields' | 'stock'>,
): ChoiceContext {
  const machine = machines.find((m) => m.id === design.machineId) ?? null;
  const spot = machine?.spotPresets.find((preset) => preset.id === design.spotPresetId) ?? NO_SPOT;
  const size = placedSize(order.fields);
  return {
    machines,
    machine,
    machineName: machine?.name ?? 'a machine not yet chosen',
    spot,
    stockName: order.stock?.name ?? null,
    speedUnit: machine?.speedUnit ?? 'mm/s',
    widthMm: size?.widthMm ?? null,
    heightMm: size?.heightMm ?? null,
  };
}
