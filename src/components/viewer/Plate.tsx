import type { RefObject } from 'react';
import type { Finding } from '@/lib/preflight/finding';
import type { CompareWay } from './CompareWay';
import { Pane, type PaneLayer } from './Pane';
import { PICTURE_WORDS, type ViewerPicture } from './pictures';
import { Places } from './Places';
import { SweepHandle } from './SweepHandle';
import type { LoadedImage } from './use-images';
import type { ViewControl } from './use-view';
import type { PlateSize } from './view';

interface Props {
  element: RefObject<HTMLDivElement | null>;
  /** one picture, or two to compare */
  shown: readonly ViewerPicture[];
  loaded: (url: string | null) => LoadedImage;
  way: CompareWay;
  held: boolean;
  sweep: number;
  onSweep: (share: number) => void;
  control: ViewControl;
  plate: PlateSize;
  laid: number;
  findings: readonly Finding[];
  lit: string | null;
  onLit: (id: string | null) => void;
  label: string;
  handlers: React.DOMAttributes<HTMLDivElement>;
}

function layersOf({ shown, loaded, way, held, sweep }: Props): PaneLayer[][] {
  const layer = (picture: ViewerPicture, from: number, to: number): PaneLayer => ({
    picture,
    image: loaded(picture.url),
    detail: loaded(picture.detail?.url ?? null),
    from,
    to,
  });
  const [first, second] = shown;
  if (!first) return [[]];
  if (!second) return [[layer(first, 0, 1)]];
  if (held)
    return way === 'side-by-side' ? [[layer(second, 0, 1)], [layer(first, 0, 1)]] : [[layer(second, 0, 1)]];
  if (way === 'side-by-side') return [[layer(first, 0, 1)], [layer(second, 0, 1)]];
  if (way === 'hold') return [[layer(first, 0, 1)]];
  return [[layer(first, 0, sweep), layer(second, sweep, 1)]];
}

function Caption({ name, side }: { name: ViewerPicture['name']; side: 'left' | 'right' }) {
  return (
    <span
      className={`pointer-events-none absolute bottom-2 z-[1] bg-sheet px-2 py-0.5 text-13 text-ink ${side === 'left' ? 'left-2' : 'right-2'}`}
    >
      {PICTURE_WORDS[name].name}
    </span>
  );
}

/** The plate: one or two panes in the well, captions, the sweep's line, and the places of the findings. */
export function Plate(props: Props) {
  const { element, shown, way, held, control, plate, findings, lit, onLit, sweep, onSweep } = props;
  const panes = layersOf(props);
  const sweeping = way === 'sweep' && shown.length === 2 && !held;
  return (
    <div
      ref={element}
      role="application"
      aria-roledescription="picture viewer"
      aria-label={props.label}
      tabIndex={0}
      className={`relative flex max-h-[min(62vh,560px)] min-h-[240px] w-full select-none gap-px bg-edge max-md:max-h-[56vh] ${panes.length > 1 ? 'max-md:flex-col' : ''} ${control.isFitted ? 'cursor-default touch-pan-y' : 'cursor-grab touch-none active:cursor-grabbing'}`}
      style={{ aspectRatio: `${plate.widthMm} / ${plate.heightMm}` }}
      {...props.handlers}
    >
      {panes.map((layers, index) => (
        <div key={index} className="relative min-h-0 min-w-0 flex-1 overflow-hidden bg-well">
          <Pane
            layers={layers}
            view={control.view}
            frame={control.frame}
            plate={plate}
            laid={props.laid}
            onSize={index === 0 ? control.setFrame : undefined}
          />
          <Places
            findings={findings}
            view={control.view}
            frame={control.frame}
            lit={lit}
            onLight={onLit}
            onChoose={onLit}
          />
          {layers.map((layer, place) => (
            <Caption
              key={layer.picture.name}
              name={layer.picture.name}
              side={place === 0 ? 'left' : 'right'}
            />
          ))}
        </div>
      ))}
      {sweeping && (
        <SweepHandle
          share={sweep}
          onChange={onSweep}
          leftName={PICTURE_WORDS[shown[0].name].name}
          rightName={PICTURE_WORDS[shown[1].name].name}
        />
      )}
    </div>
  );
}
