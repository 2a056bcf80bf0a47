import { inchesToMm, mmToInches } from '@/lib/units';
import { NumberField } from './NumberField';

export type LengthUnit = 'mm' | 'in';

interface Props {
  label: string;
  unit: LengthUnit;
  /** always mm, whatever is shown */
  valueMm: number | null;
  onChangeMm: (valueMm: number | null) => void;
  minMm?: number;
  maxMm?: number;
  why?: string;
  wrong?: string;
  name?: string;
  isDisabled?: boolean;
}

const DECIMALS = { mm: 2, in: 3 } as const;

/** Figure shown for a length: mm to 0.01, inches to 0.001. 25.4 mm in inches is 1. */
export function shownLength(valueMm: number, unit: LengthUnit): number {
  const value = unit === 'mm' ? valueMm : mmToInches(valueMm);
  return Number(value.toFixed(DECIMALS[unit]));
}

/** A length kept in mm and entered in mm or inches. Looking at it in the other unit never changes it. */
export function LengthField({ unit, valueMm, onChangeMm, minMm, maxMm, ...props }: Props) {
  const toShown = (mm: number | undefined) => (mm === undefined ? undefined : shownLength(mm, unit));
  const change = (shown: number | null) => {
    if (shown === null) return onChangeMm(null);
    if (valueMm !== null && shown === shownLength(valueMm, unit)) return;
    onChangeMm(unit === 'mm' ? shown : Number(inchesToMm(shown).toFixed(4)));
  };
  return (
    <NumberField
      {...props}
      unit={unit}
      decimals={DECIMALS[unit]}
      value={valueMm === null ? null : shownLength(valueMm, unit)}
      onChange={change}
      minValue={toShown(minMm)}
      maxValue={toShown(maxMm)}
    />
  );
}
