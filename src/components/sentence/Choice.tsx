import type { ChoiceId } from '@/lib/orders/sentence';
import type { ChoiceProps } from './context';
import { CornersChoice, MirrorChoice, ScreenChoice, TreatmentChoice } from './DrawnChoices';
import { MachineChoice } from './MachineChoice';
import { RecipeChoice } from './RecipeChoice';
import { DirectionChoice, PassesChoice, PitchChoice } from './ScanChoices';
import { DividingLevelChoice, ToneChoice } from './ToneChoices';

export const CHOICE_TITLES: Record<ChoiceId, string> = {
  treatment: 'Treatment',
  screen: 'Screen',
  'dividing-level': 'Dividing level',
  corners: 'Corners',
  'line-pitch': 'Line pitch',
  direction: 'Scan direction',
  passes: 'Passes',
  tone: 'Tone',
  mirror: 'Mirror',
  machine: 'Machine and spot',
  recipe: 'Power, speed and focus',
};

/** The one choice that a word of the sentence opens. */
export function Choice({ id, ...props }: ChoiceProps & { id: ChoiceId }) {
  switch (id) {
    case 'treatment':
      return <TreatmentChoice {...props} />;
    case 'screen':
      return <ScreenChoice {...props} />;
    case 'dividing-level':
      return <DividingLevelChoice {...props} />;
    case 'corners':
      return <CornersChoice {...props} />;
    case 'line-pitch':
      return <PitchChoice {...props} />;
    case 'direction':
      return <DirectionChoice {...props} />;
    case 'passes':
      return <PassesChoice {...props} />;
    case 'tone':
      return <ToneChoice {...props} />;
    case 'mirror':
      return <MirrorChoice {...props} />;
    case 'machine':
      return <MachineChoice {...props} />;
    case 'recipe':
      return <RecipeChoice {...props} />;
  }
}
