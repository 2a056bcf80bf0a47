import { Controller, useFormContext, useWatch } from 'react-hook-form';
import type { StockView } from '@/lib/orders/views';
import type { CheckReport } from '@/lib/prepare/report';
import type { Treatment } from '@/lib/prepare/settings';
import { SHADE_STEPS, type Route } from '@/lib/stock/stock';
import { routeRefusal } from '@/lib/stock/cautions';
import { withLightness } from '../lightness-colour';
import { RadioCards } from '../RadioCards';
import type { DraftForm } from './draft-form';
import { TreatmentDrawing } from './drawings';
import { Part } from './Part';

const TREATMENTS: readonly { id: Treatment; name: string; words: string }[] = [
  { id: 'linework', name: 'Linework', words: 'Lines are followed, as with a pen.' },
  { id: 'solid', name: 'Solid', words: 'Filled, burned or not burned.' },
  { id: 'halftone', name: 'Halftone', words: 'Greys as dots, for photographs.' },
  { id: 'continuous', name: 'Continuous tone', words: 'Greys as levels of power.' },
];

const ROUTES: readonly { id: Route; name: string; words: string }[] = [
  { id: 'bare-burn', name: 'Bare burn', words: 'Light to dark brown, as the stock gives it.' },
  { id: 'darkening-wash', name: 'Darkening wash', words: 'Near black. Not for food, not for a child.' },
  { id: 'paint-fill', name: 'Paint fill', words: 'Any colour, painted in afterwards.' },
];

interface Props {
  check: CheckReport | null;
  stock: StockView | null;
}

/** What becomes of the artwork, how dark, and by which route. */
export function LookPart({ check, stock }: Props) {
  const { control } = useFormContext<DraftForm>();
  const suggested = check?.artwork.suggestedTreatment ?? null;
  const choices = TREATMENTS.map((treatment) => ({
    ...treatment,
    name: treatment.id === suggested ? `${treatment.name}, suggested` : treatment.name,
    drawing: <TreatmentDrawing treatment={treatment.id} />,
  }));
  return (
    <Part title="Look" words={check?.artwork.suggestionReason}>
      <Controller
        control={control}
        name="treatment"
        render={({ field }) => (
          <RadioCards
            label="Treatment"
            choices={choices}
            value={field.value ?? suggested}
            onChange={field.onChange}
            columns={2}
            small
          />
        )}
      />
      <ShadeChoice stock={stock} />
      {stock && stock.routes.length > 0 && <RouteChoice stock={stock} />}
    </Part>
  );
}

const OPEN = 'open';

function ShadeChoice({ stock }: { stock: StockView | null }) {
  const { control } = useFormContext<DraftForm>();
  const colour = stock?.markColour ?? '#6b4a2f';
  const steps = SHADE_STEPS.map(({ name, lstar }) => ({
    id: String(lstar),
    name,
    words: lstar === 28 ? 'L* 28 and below' : `L* ${lstar}`,
    drawing: (
      <span
        aria-hidden="true"
        className="block h-[40px] w-full border border-edge"
        style={{ background: withLightness(colour, lstar) }}
      />
    ),
  }));
  const none = {
    id: OPEN,
    name: 'As it comes',
    words: 'The shop chooses',
    drawing: <span aria-hidden="true" className="block h-[40px] w-full border border-dashed border-edge" />,
  };
  return (
    <Controller
      control={control}
      name="shadeLstar"
      render={({ field }) => (
        <RadioCards
          label="Shade"
          why="How dark the mark shall be. Wood differs from board to board; the proof says how near we come."
          choices={[none, ...steps]}
          value={field.value === null ? OPEN : String(field.value)}
          onChange={(id) => field.onChange(id === OPEN ? null : Number(id))}
          columns={3}
          small
        />
      )}
    />
  );
}

function RouteChoice({ stock }: { stock: StockView }) {
  const { control } = useFormContext<DraftForm>();
  const use = useWatch({ control, name: 'use' });
  const choices = ROUTES.filter(({ id }) => stock.routes.includes(id)).map((route) => {
    const refusal = routeRefusal(stock, route.id, use);
    return { ...route, words: refusal ?? route.words, disabled: refusal !== null };
  });
  return (
    <Controller
      control={control}
      name="route"
      render={({ field }) => (
        <RadioCards label="Route" choices={choices} value={field.value} onChange={field.onChange} />
      )}
    />
  );
}
