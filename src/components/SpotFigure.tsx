import type { Spot } from '@/lib/machines/spot';

interface Props {
  spot: Spot;
  /** how many px one mm takes; 200 makes a 0.1 mm spot 20 px */
  pxPerMm?: number;
  /** write width × height beside it */
  written?: boolean;
}

/** A spot in its true shape and proportion, drawn to scale. */
export function SpotFigure({ spot, pxPerMm = 200, written = true }: Props) {
  const w = spot.widthMm * pxPerMm;
  const h = spot.heightMm * pxPerMm;
  const words = `${spot.shape === 'ellipse' ? 'Elliptical' : 'Rectangular'} spot, ${spot.widthMm} by ${spot.heightMm} mm`;
  return (
    <span className="figure inline-flex items-center gap-2 align-middle">
      <svg
        width={w + 2}
        height={h + 2}
        viewBox={`-1 -1 ${w + 2} ${h + 2}`}
        role="img"
        aria-label={words}
        className="flex-none"
      >
        {spot.shape === 'ellipse' ? (
          <ellipse cx={w / 2} cy={h / 2} rx={w / 2} ry={h / 2} fill="currentColor" />
        ) : (
          <rect width={w} height={h} fill="currentColor" />
        )}
      </svg>
      {written && (
        <span>
          {spot.widthMm.toFixed(2)} × {spot.heightMm.toFixed(2)}
          <span className="unit">mm</span>
        </span>
      )}
    </span>
  );
}
