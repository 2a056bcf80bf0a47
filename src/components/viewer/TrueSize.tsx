import { useState } from 'react';
import { CSS_PX_PER_INCH, mmToInches } from '@/lib/units';
import { Button } from '../Button';
import { Dialog } from '../Dialog';
import { Slider } from '../Slider';

/** ISO/IEC 7810, ID-1: the size of every bank card. */
const CARD = { widthMm: 85.6, heightMm: 53.98 };
const KEPT = 'umberline-screen-px-per-mm';

function keptScale(): number | null {
  const value = Number(window.localStorage.getItem(KEPT));
  return value > 1 && value < 40 ? value : null;
}

/** Shows the artwork at the size it will have. Asks once for a bank card, because screens do not tell their size. */
export function TrueSize({ onScale }: { onScale: (pxPerMm: number) => void }) {
  const [asking, setAsking] = useState(false);
  const [pxPerMm, setPxPerMm] = useState(mmToInches(CSS_PX_PER_INCH));
  const start = () => {
    const kept = keptScale();
    if (kept) onScale(kept);
    else setAsking(true);
  };
  const keep = () => {
    window.localStorage.setItem(KEPT, String(pxPerMm));
    setAsking(false);
    onScale(pxPerMm);
  };
  return (
    <>
      <Button kind="text" onPress={start}>
        True size
      </Button>
      <Dialog title="How large is your screen?" isOpen={asking} onClose={() => setAsking(false)}>
        <p className="text-15">Hold a bank card against the drawing and move the slider until both are equally wide. It is asked once.</p>
        <div className="overflow-hidden">
          <svg
            role="img"
            aria-label="Outline of a bank card"
            width={CARD.widthMm * pxPerMm}
            height={CARD.heightMm * pxPerMm}
            className="block max-w-none"
          >
            <rect x="0.5" y="0.5" width={CARD.widthMm * pxPerMm - 1} height={CARD.heightMm * pxPerMm - 1} rx={3.18 * pxPerMm} fill="none" stroke="var(--ink)" />
            <text x="16" y="28" fill="var(--quiet)" fontSize="13">
              85.60 × 53.98 mm
            </text>
          </svg>
        </div>
        <Slider label="Screen pixels in a millimetre" value={pxPerMm} onChange={setPxPerMm} min={2} max={8} step={0.01} decimals={2} />
        <div className="flex gap-2">
          <Button kind="filled" onPress={keep}>
            Keep this size
          </Button>
          <Button kind="text" onPress={() => setAsking(false)}>
            Leave it
          </Button>
        </div>
      </Dialog>
    </>
  );
}
