import type { Finding } from '@/lib/preflight/finding';
import { AnnotatedPlate } from '../AnnotatedPlate';
import { Figure } from '../Figure';
import { Island } from '../Island';
import plate from './fern-plate.json';

// Held to its schema by a test, so that the front page need not bring one.
const findings = plate.findings as Finding[];

/** A drawing of our own as the pipeline sees it: the burn forecast, and what was found in it. */
export default function FernPlate() {
  return (
    <Island>
      <AnnotatedPlate
        src="/front/fern-burned.webp"
        alt="Burn forecast of a drawn fern on birch plywood: dark brown on pale wood"
        widthMm={plate.widthMm}
        heightMm={plate.heightMm}
        linePitchMm={plate.linePitchMm}
        findings={findings}
        after={
          <p className="border-t border-hair pt-4 text-15">
            Every line and gap holds from{' '}
            <strong className="font-semibold">
              <Figure value={plate.smallestSoundWidthMm} unit="mm" decimals={0} />
            </strong>{' '}
            wide.
          </p>
        }
      />
    </Island>
  );
}
