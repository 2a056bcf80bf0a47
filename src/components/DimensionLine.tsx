import { mmToInches } from '@/lib/units';

interface Props {
  lengthMm: number;
  /** along the top of what is measured, or along its left side */
  along: 'x' | 'y';
  unit?: 'mm' | 'in';
}

/** A size written as a dimension line: two ends, a thin line, the figure in its middle. */
export function DimensionLine({ lengthMm, along, unit = 'mm' }: Props) {
  const figure = unit === 'mm' ? Number(lengthMm.toFixed(2)) : Number(mmToInches(lengthMm).toFixed(3));
  const text = (
    <span
      className="figure px-2 text-13 leading-none"
      style={along === 'y' ? { writingMode: 'vertical-rl', rotate: '180deg', padding: '8px 0' } : undefined}
    >
      {figure}
      <span className="unit" style={along === 'y' ? { margin: '0.18em 0 0' } : undefined}>
        {unit}
      </span>
    </span>
  );
  const line = along === 'x' ? 'h-px flex-1 bg-current' : 'w-px flex-1 bg-current';
  const end = along === 'x' ? 'h-[9px] w-px bg-current' : 'h-px w-[9px] bg-current';
  return (
    <span className={`flex items-center ${along === 'x' ? 'w-full flex-row' : 'h-full flex-col'}`}>
      <span className={end} />
      <span className={line} />
      {text}
      <span className={line} />
      <span className={end} />
    </span>
  );
}
