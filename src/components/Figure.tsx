interface Props {
  value: number;
  unit: string;
  decimals?: number;
}

/** A figure with its unit, kept on one line. */
export function Figure({ value, unit, decimals = 2 }: Props) {
  return (
    <span className="figure">
      {value.toFixed(decimals)}
      <span className="unit">{unit}</span>
    </span>
  );
}
