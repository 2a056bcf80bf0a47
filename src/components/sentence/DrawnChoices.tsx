import { SCREEN_WORDS, TREATMENT_WORDS } from '@/lib/orders/sentence';
import { SCREEN_NAMES, screenNameSchema, treatmentSchema } from '@/lib/prepare/settings';
import { RadioCards } from '../RadioCards';
import type { ChoiceProps } from './context';
import { TreatmentDrawing } from '../new-order/drawings';
import { CornersDrawing, MirrorDrawing, ScreenDrawing } from './drawings';

const TREATMENT_WHY = {
  linework: 'Lines are followed, one stroke wide.',
  solid: 'Filled, two levels: burned or untouched.',
  halftone: 'Tones as dots of one darkness.',
  continuous: 'Tones as power levels, no dots.',
} as const;

export function TreatmentChoice({ design, onChange }: ChoiceProps) {
  return (
    <RadioCards
      label="What becomes of the artwork"
      columns={2}
      value={design.treatment}
      onChange={(id) => onChange({ ...design, treatment: treatmentSchema.parse(id) })}
      choices={treatmentSchema.options.map((id) => ({
        id,
        name: TREATMENT_WORDS[id].replace(/^./, (first) => first.toUpperCase()),
        words: TREATMENT_WHY[id],
        drawing: <TreatmentDrawing treatment={id} />,
      }))}
    />
  );
}

const OWN_WHY = 'Dots without a pattern that the eye can find. It keeps small tones apart.';
const published = SCREEN_NAMES.filter((name) => name.startsWith('published:'));

export function ScreenChoice({ design, onChange }: ChoiceProps) {
  const choose = (id: string) => onChange({ ...design, screen: screenNameSchema.parse(id) });
  const card = (id: (typeof SCREEN_NAMES)[number], name: string, words?: string) => ({
    id,
    name,
    words,
    drawing: <ScreenDrawing screen={id} />,
  });
  return (
    <div className="flex flex-col gap-6">
      <RadioCards
        label="Our own"
        columns={2}
        value={design.screen === 'even-grain' ? design.screen : null}
        onChange={choose}
        choices={[card('even-grain', 'Even grain', OWN_WHY)]}
      />
      <RadioCards
        label="For comparison"
        why="As published. Useful to see what another method would do with the same tones."
        columns={2}
        value={design.screen === 'even-grain' ? null : design.screen}
        onChange={choose}
        choices={published.map((id) => card(id, SCREEN_WORDS[id]))}
      />
    </div>
  );
}

export function CornersChoice({ design, onChange }: ChoiceProps) {
  return (
    <RadioCards
      label="Corners of traced outlines"
      columns={2}
      small
      value={design.corners}
      onChange={(id) => onChange({ ...design, corners: id === 'eased' ? 'eased' : 'kept' })}
      choices={[
        {
          id: 'kept',
          name: 'Kept',
          words: 'As sharp as they were drawn.',
          drawing: <CornersDrawing corners="kept" />,
        },
        {
          id: 'eased',
          name: 'Eased',
          words: 'Rounded, so that the head need not stop.',
          drawing: <CornersDrawing corners="eased" />,
        },
      ]}
    />
  );
}

export function MirrorChoice({ design, onChange }: ChoiceProps) {
  return (
    <RadioCards
      label="Side that it is seen from"
      columns={2}
      small
      value={design.mirror ? 'yes' : 'no'}
      onChange={(id) => onChange({ ...design, mirror: id === 'yes' })}
      choices={[
        {
          id: 'no',
          name: 'Not mirrored',
          words: 'Seen from the engraved side.',
          drawing: <MirrorDrawing mirror={false} />,
        },
        {
          id: 'yes',
          name: 'Mirrored',
          words: 'Seen through the back, or for a stamp.',
          drawing: <MirrorDrawing mirror />,
        },
      ]}
    />
  );
}
