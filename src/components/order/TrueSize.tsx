import { useState } from 'react';
import { Button } from '../Button';
import { Dialog } from '../Dialog';
import { Slider } from '../Slider';
import { useNarrow } from '../use-narrow';
import { CARD_HEIGHT_MM, CARD_WIDTH_MM, CLAIMED_PX_PER_MM, keepScale, keptScale } from './screen-scale';

interface Props {
  src: string;
  widthMm: number;
  heightMm: number;
}

/** The forecast as large as it will be; asks once for a bank card, because screens do not know their own size. */
export function TrueSize({ src, widthMm, heightMm }: Props) {
  const [isOpen, setOpen] = useState(false);
  const [scale, setScale] = useState<number | null>(null);
  const open = () => {
    setScale(keptScale());
    setOpen(true);
  };
  return (
    <div>
      <Button onPress={open}>See true size</Button>
      <Dialog
        title={scale === null ? 'How big is your screen?' : 'True size'}
        isOpen={isOpen}
        onClose={() => setOpen(false)}
        wide={scale !== null}
      >
        {scale === null ? (
          <CardMeasure
            onDone={(pxPerMm) => {
              keepScale(pxPerMm);
              setScale(pxPerMm);
            }}
          />
        ) : (
          <>
            <div
              className="max-h-[70vh] overflow-auto bg-well"
              tabIndex={0}
              role="region"
              aria-label="Forecast at true size"
            >
              <img
                src={src}
                alt="The burn forecast at true size"
                className="max-w-none"
                style={{ width: widthMm * scale, height: heightMm * scale }}
              />
            </div>
            <div className="flex flex-wrap gap-2">
              <Button onPress={() => setScale(null)}>Measure the screen again</Button>
              <Button onPress={() => setOpen(false)}>Close</Button>
            </div>
          </>
        )}
      </Dialog>
    </div>
  );
}

/** A drawing of a bank card that is made as wide as a real one: what a screen's pixels measure. */
export function CardMeasure({ onDone }: { onDone: (pxPerMm: number) => void }) {
  const [pxPerMm, setPxPerMm] = useState(CLAIMED_PX_PER_MM);
  // A card lying does not fit on a phone; upright it does.
  const upright = useNarrow();
  const [widthMm, heightMm] = upright ? [CARD_HEIGHT_MM, CARD_WIDTH_MM] : [CARD_WIDTH_MM, CARD_HEIGHT_MM];
  return (
    <>
      <p className="text-15">
        Hold a bank card {upright ? 'upright ' : ''}against the screen, and slide until the drawing is as wide
        as the card. It is asked only once.
      </p>
      <div className="overflow-hidden">
        <div
          className="rounded border border-ink"
          style={{ width: widthMm * pxPerMm, height: Math.min(heightMm * pxPerMm, 220) }}
          aria-hidden="true"
        />
      </div>
      <Slider
        label="Width of the drawing"
        value={Math.round(widthMm * pxPerMm)}
        onChange={(px) => setPxPerMm(px / widthMm)}
        min={Math.round(widthMm * 2)}
        max={Math.round(widthMm * (upright ? 5.5 : 9))}
        step={1}
        unit="px"
        decimals={0}
      />
      <div>
        <Button onPress={() => onDone(pxPerMm)}>It matches</Button>
      </div>
    </>
  );
}
