import { findingSchema, type Finding } from '@/lib/preflight/finding';
import { AnnotatedPlate } from '../AnnotatedPlate';
import { Island } from '../Island';
import plate from './fern-plate.json';

const findings: Finding[] = findingSchema.array().parse(plate.findings);

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
      />
    </Island>
  );
}
