import type { SpotPreset } from '@/lib/machines/machine';
import { lineExtent, sizeAcross } from '@/lib/machines/spot';
import { pitchWords, spotWords } from '@/lib/orders/sentence';

interface Props {
  preset: SpotPreset;
  pxPerMm?: number;
}

const WIDTH = 112;

/** A spot to scale, and four lines of it at pitch ratio 1, at 0° and at 90°. */
export function SpotLines({ preset, pxPerMm = 160 }: Props) {
  const w = preset.widthMm * pxPerMm;
  const h = preset.heightMm * pxPerMm;
  const extents = { flat: lineExtent(preset, 0) * pxPerMm, upright: lineExtent(preset, 90) * pxPerMm };
  const height = Math.max(h, extents.flat * 4, 4 * extents.upright, 40) + 4;
  const left = Math.max(w, 24) + 24;
  const width = left + WIDTH + 24 + 4 * extents.upright + 2;
  return (
    <svg
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={`Spot of ${spotWords(preset)}, with four lines at 0 degrees, ${pitchWords(sizeAcross(preset, 0))} apart, and at 90 degrees, ${pitchWords(sizeAcross(preset, 90))} apart`}
      className="max-w-full text-ink"
    >
      <g transform={`translate(${w / 2 + 1} ${height / 2})`} fill="currentColor">
        {preset.shape === 'ellipse' ? (
          <ellipse rx={w / 2} ry={h / 2} />
        ) : (
          <rect x={-w / 2} y={-h / 2} width={w} height={h} />
        )}
      </g>
      <g transform={`translate(${left} 2)`} fill="currentColor">
        {[0, 1, 2, 3].map((i) => (
          <rect
            key={i}
            y={i * extents.flat}
            width={WIDTH}
            height={extents.flat - 1}
            rx={preset.shape === 'ellipse' ? extents.flat / 2 : 0}
            opacity="0.75"
          />
        ))}
      </g>
      <g transform={`translate(${left + WIDTH + 24} 2)`} fill="currentColor">
        {[0, 1, 2, 3].map((i) => (
          <rect
            key={i}
            x={i * extents.upright}
            width={extents.upright - 1}
            height={height - 4}
            rx={preset.shape === 'ellipse' ? extents.upright / 2 : 0}
            opacity="0.75"
          />
        ))}
      </g>
    </svg>
  );
}
