import type { LengthUnit } from '../LengthField';

const UNITS = [
  { id: 'mm', name: 'mm' },
  { id: 'in', name: 'inches' },
] as const;

/** Which unit lengths are entered in; they are kept in mm. */
export function UnitChoice({ unit, onUnit }: { unit: LengthUnit; onUnit: (unit: LengthUnit) => void }) {
  return (
    <fieldset className="flex items-center gap-4 text-15">
      <legend className="hidden-words">Unit of lengths</legend>
      {UNITS.map(({ id, name }) => (
        <label key={id} className="flex min-h-target cursor-pointer items-center gap-2">
          <input
            type="radio"
            name="length-unit"
            value={id}
            checked={unit === id}
            onChange={() => onUnit(id)}
            className="h-[18px] w-[18px] accent-[--action]"
          />
          {name}
        </label>
      ))}
    </fieldset>
  );
}
