import { angleWords, pitchConsequence, pitchWords } from '@/lib/orders/sentence';
import { scanFor } from '@/lib/prepare/settings';
import { pitchToLinesPerCm, scanLines } from '@/lib/units';
import { Button } from '../Button';
import { Checkbox } from '../Checkbox';
import { NumberField } from '../NumberField';
import { RadioCards } from '../RadioCards';
import type { ChoiceProps } from './context';
import { DirectionDrawing, LinesDrawing } from './drawings';

const PITCH = { minValue: 0.01, maxValue: 2, decimals: 3, unit: 'mm' } as const;
const inPitchRange = (value: number | null): value is number => value !== null && value >= 0.01 && value <= 2;

function rowsWords({ design, context }: Pick<ChoiceProps, 'design' | 'context'>): string {
  const { directionDeg, linePitchMm } = design.scan;
  const extent = Math.abs(directionDeg % 180) === 90 ? context.widthMm : context.heightMm;
  if (extent === null || directionDeg % 90 !== 0) return '';
  return `${scanLines(extent, linePitchMm).toLocaleString('en-GB')} scan lines on ${Number(extent.toFixed(2))} mm.`;
}

export function PitchChoice({ design, context, onChange }: ChoiceProps) {
  const { scan } = design;
  const { ratio, words, sizeAcrossMm } = pitchConsequence(context.spot, scan.directionDeg, scan.linePitchMm);
  const asked = scanFor(context.spot, scan.directionDeg).linePitchMm;
  const same = scan.alongPitchMm === scan.linePitchMm;
  const setLine = (value: number | null) => {
    if (inPitchRange(value))
      onChange({
        ...design,
        scan: { ...scan, linePitchMm: value, alongPitchMm: same ? value : scan.alongPitchMm },
      });
  };
  return (
    <div className="flex flex-col gap-4">
      <LinesDrawing spot={context.spot} directionDeg={scan.directionDeg} linePitchMm={scan.linePitchMm} />
      <NumberField
        label="Distance between scan lines"
        {...PITCH}
        step={0.001}
        value={scan.linePitchMm}
        onChange={setLine}
        why="From 0.010 to 2.000 mm. Lines that overlap darken and turn uneven; lines that part turn lighter and striped."
      />
      <p className="text-15">
        Pitch ratio {ratio.toFixed(2)}: {words}. {Number(pitchToLinesPerCm(scan.linePitchMm).toFixed(1))}{' '}
        lines per cm. {rowsWords({ design, context })}
      </p>
      {Math.abs(scan.linePitchMm - asked) > 0.0005 && (
        <p className="text-15">
          The spot is {sizeAcrossMm.toFixed(3)} mm across this direction.
          <span className="-ml-2 block">
            <Button kind="text" onPress={() => setLine(asked)}>
              Use {pitchWords(asked)}
            </Button>
          </span>
        </p>
      )}
      <Checkbox
        isSelected={same}
        onChange={(selected) =>
          onChange({
            ...design,
            scan: { ...scan, alongPitchMm: selected ? scan.linePitchMm : scan.alongPitchMm + 0.01 },
          })
        }
      >
        The same distance between pixels along a line
      </Checkbox>
      {!same && (
        <NumberField
          label="Distance between pixels along a line"
          {...PITCH}
          step={0.001}
          value={scan.alongPitchMm}
          onChange={(value) =>
            inPitchRange(value) && onChange({ ...design, scan: { ...scan, alongPitchMm: value } })
          }
        />
      )}
    </div>
  );
}

const COMMON_ANGLES = [0, 45, 90] as const;

export function DirectionChoice({ design, context, onChange }: ChoiceProps) {
  const { scan } = design;
  const set = (directionDeg: number) => onChange({ ...design, scan: { ...scan, directionDeg } });
  const asked = scanFor(context.spot, scan.directionDeg).linePitchMm;
  return (
    <div className="flex flex-col gap-4">
      <RadioCards
        label="Angle of the scan lines"
        columns={3}
        small
        value={COMMON_ANGLES.some((a) => a === scan.directionDeg) ? String(scan.directionDeg) : null}
        onChange={(id) => set(Number(id))}
        choices={COMMON_ANGLES.map((angle) => ({
          id: String(angle),
          name: angleWords(angle),
          drawing: <DirectionDrawing directionDeg={angle} />,
        }))}
      />
      <NumberField
        label="Another angle to X"
        unit="°"
        minValue={-180}
        maxValue={180}
        decimals={2}
        value={scan.directionDeg}
        onChange={(value) => value !== null && value >= -180 && value <= 180 && set(value)}
        why="From −180 to 180°. Across the grain hides the lines; along it follows them."
      />
      <p className="text-15">
        {pitchConsequence(context.spot, scan.directionDeg, scan.linePitchMm).words.replace(/^./, (c) =>
          c.toUpperCase(),
        )}{' '}
        at {pitchWords(scan.linePitchMm)}. This spot asks for {pitchWords(asked)} at this angle; the pitch
        stays as it is until you change it.
      </p>
    </div>
  );
}

export function PassesChoice({ design, context, onChange }: ChoiceProps) {
  const { perpendicular, scan } = design;
  const across = scanFor(context.spot, scan.directionDeg + 90);
  const second = { linePitchMm: across.linePitchMm, alongPitchMm: across.alongPitchMm };
  return (
    <div className="flex flex-col gap-4">
      <RadioCards
        label="Passes"
        columns={2}
        small
        value={perpendicular ? 'two' : 'one'}
        onChange={(id) => onChange({ ...design, perpendicular: id === 'two' ? second : null })}
        choices={[
          {
            id: 'one',
            name: 'One pass',
            words: 'The usual.',
            drawing: <DirectionDrawing directionDeg={scan.directionDeg} />,
          },
          {
            id: 'two',
            name: 'And a perpendicular one',
            words: 'Darker, more even, deeper.',
            drawing: <DirectionDrawing directionDeg={scan.directionDeg} second />,
          },
        ]}
      />
      {perpendicular && (
        <NumberField
          label="Distance between lines of the second pass"
          {...PITCH}
          step={0.001}
          value={perpendicular.linePitchMm}
          onChange={(value) =>
            inPitchRange(value) &&
            onChange({ ...design, perpendicular: { linePitchMm: value, alongPitchMm: value } })
          }
          why={`The spot is ${across.linePitchMm.toFixed(3)} mm across the second direction.`}
        />
      )}
    </div>
  );
}
