import { useState } from 'react';
import { Button } from '../Button';
import { Dialog } from '../Dialog';
import { keepScale, keptScale } from '../order/screen-scale';
import { CardMeasure } from '../order/TrueSize';

/** Shows the artwork as large as it will be. Asks once for a bank card, because screens do not know their own size. */
export function TrueSize({ onScale }: { onScale: (pxPerMm: number) => void }) {
  const [asking, setAsking] = useState(false);
  const start = () => {
    const kept = keptScale();
    if (kept === null) setAsking(true);
    else onScale(kept);
  };
  const keep = (pxPerMm: number) => {
    keepScale(pxPerMm);
    setAsking(false);
    onScale(pxPerMm);
  };
  return (
    <>
      <Button kind="text" onPress={start}>
        True size
      </Button>
      <Dialog title="How big is your screen?" isOpen={asking} onClose={() => setAsking(false)}>
        <CardMeasure onDone={keep} />
      </Dialog>
    </>
  );
}
