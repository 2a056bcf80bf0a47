/** A colour of wood or shade as a swatch; never an interface colour. */
export function Swatch({ colour, size = 24 }: { colour: string; size?: number }) {
  return (
    <span
      aria-hidden="true"
      className="inline-block flex-none border border-edge"
      style={{ width: size, height: size, background: colour }}
    />
  );
}
