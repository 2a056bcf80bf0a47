import { Button } from '../Button';
import { wholePixelZoom, type View } from './view';
import type { ViewControl } from './use-view';

interface Props {
  control: ViewControl;
  pitchMm: number;
  children?: React.ReactNode;
}

/** Screen pixels that one prepared pixel gets when single pixels are looked at. */
const SINGLE_PX = 16;

/** The same as the keys do, in words. */
export function ViewWords({ control, pitchMm, children }: Props) {
  const single = () => {
    const ratio = window.devicePixelRatio || 1;
    control.change((view: View) => ({ ...view, pxPerMm: wholePixelZoom(pitchMm, SINGLE_PX * ratio, ratio) }));
  };
  return (
    <div className="-ml-2 flex flex-wrap items-center">
      <Button kind="text" onPress={() => control.zoom(1.5)}>
        Closer
      </Button>
      <Button kind="text" onPress={() => control.zoom(1 / 1.5)}>
        Further
      </Button>
      <Button kind="text" onPress={control.fit}>
        Whole artwork
      </Button>
      <Button kind="text" onPress={single}>
        Single pixels
      </Button>
      {children}
    </div>
  );
}
