import { placeOnBlank, type Blank, type Placement } from '@/lib/orders/order';
import { lstarOf } from './lightness-colour';

interface Props {
  blank: Pick<Blank, 'outline' | 'widthMm' | 'heightMm' | 'grainDeg'>;
  placement: Placement;
  /** before quarter turns */
  artworkMm: { widthMm: number; heightMm: number };
  /** the artwork as it is placed */
  pictureUrl?: string | null;
  /** colour of the stock's ground; without it the drawing is plain */
  groundColour?: string | null;
}

/** The blank to scale with the artwork where it will lie, its datum, and the grain. */
export function PlacementFigure({ blank, placement, artworkMm, pictureUrl, groundColour }: Props) {
  const turned = placement.quarterTurns % 2 === 1;
  const width = turned ? artworkMm.heightMm : artworkMm.widthMm;
  const height = turned ? artworkMm.widthMm : artworkMm.heightMm;
  const { leftMm, topMm } = placeOnBlank(blank, placement, width, height);
  const unit = Math.max(blank.widthMm, blank.heightMm) / 400;
  const room = 34 * unit;
  const outside =
    leftMm < -0.005 ||
    topMm < -0.005 ||
    leftMm + width > blank.widthMm + 0.005 ||
    topMm + height > blank.heightMm + 0.005;
  const dark = groundColour ? lstarOf(groundColour) < 45 : false;
  // On a stock's colour the lines are the same in both themes.
  const ink = groundColour ? (dark ? '#ffffff' : '#342117') : 'var(--ink)';
  const words = `Blank of ${blank.widthMm} by ${blank.heightMm} mm, artwork ${round(leftMm)} mm from its left and ${round(topMm)} mm from its top edge`;
  const box = [-room, -room, blank.widthMm + room * 1.4, blank.heightMm + room * 1.4].join(' ');
  return (
    <figure className="flex flex-col gap-2">
      <svg
        viewBox={box}
        role="img"
        aria-label={words}
        className="max-h-[420px] w-full"
        style={{ fontSize: 12 * unit }}
        stroke="var(--ink)"
        fill="none"
        strokeWidth={unit}
      >
        <g stroke={ink}>
          <Outline blank={blank} fill={groundColour ?? 'var(--sheet)'} />
          {blank.grainDeg !== null && <Grain blank={blank} unit={unit} />}
          <g transform={`translate(${leftMm} ${topMm})`}>
            {pictureUrl && (
              <image
                href={pictureUrl}
                width={width}
                height={height}
                preserveAspectRatio="none"
                style={dark ? { filter: 'invert(1)', mixBlendMode: 'screen' } : { mixBlendMode: 'multiply' }}
              />
            )}
            <rect
              width={width}
              height={height}
              stroke={outside ? 'var(--mark-stop)' : undefined}
              strokeDasharray={`${4 * unit} ${3 * unit}`}
            />
          </g>
          <Datum blank={blank} placement={placement} unit={unit} />
        </g>
        <Sizes blank={blank} unit={unit} />
      </svg>
      <figcaption className={`text-13 ${outside ? 'text-stop' : 'text-quiet'}`}>
        {outside
          ? 'The artwork reaches over the edge of the blank.'
          : `${round(leftMm)} mm from the left edge, ${round(topMm)} mm from the top edge.`}
      </figcaption>
    </figure>
  );
}

const round = (mm: number): number => Number(mm.toFixed(1));

function Outline({ blank, fill }: { blank: Props['blank']; fill: string }) {
  const { widthMm, heightMm } = blank;
  if (blank.outline === 'round')
    return <ellipse cx={widthMm / 2} cy={heightMm / 2} rx={widthMm / 2} ry={heightMm / 2} fill={fill} />;
  return (
    <rect
      width={widthMm}
      height={heightMm}
      fill={fill}
      strokeDasharray={blank.outline === 'own' ? '3 1.5' : undefined}
    />
  );
}

/** Direction of the grain as a double-ended line in the blank's corner, never as a texture. */
function Grain({ blank, unit }: { blank: Props['blank']; unit: number }) {
  const half = 24 * unit;
  return (
    <g
      transform={`translate(${blank.widthMm / 2} ${blank.heightMm - 14 * unit}) rotate(${-(blank.grainDeg ?? 0)})`}
      opacity="0.8"
    >
      <path
        d={`M${-half} 0 H${half} M${-half + 5 * unit} ${-3 * unit} L${-half} 0 L${-half + 5 * unit} ${3 * unit} M${half - 5 * unit} ${-3 * unit} L${half} 0 L${half - 5 * unit} ${3 * unit}`}
      />
    </g>
  );
}

function Datum({ blank, placement, unit }: { blank: Props['blank']; placement: Placement; unit: number }) {
  const { datum } = placement;
  const x = datum === 'centre' ? blank.widthMm / 2 : datum.endsWith('right') ? blank.widthMm : 0;
  const y = datum === 'centre' ? blank.heightMm / 2 : datum.startsWith('bottom') ? blank.heightMm : 0;
  return (
    <g transform={`translate(${x} ${y})`}>
      <circle r={4 * unit} />
      <path d={`M${-9 * unit} 0 H${9 * unit} M0 ${-9 * unit} V${9 * unit}`} />
    </g>
  );
}

function Sizes({ blank, unit }: { blank: Props['blank']; unit: number }) {
  const { widthMm, heightMm } = blank;
  const off = -16 * unit;
  const end = 4 * unit;
  return (
    <g>
      <path
        d={`M0 ${off - end} V${off + end} M0 ${off} H${widthMm} M${widthMm} ${off - end} V${off + end}`}
      />
      <path
        d={`M${off - end} 0 H${off + end} M${off} 0 V${heightMm} M${off - end} ${heightMm} H${off + end}`}
      />
      <g fill="var(--ink)" stroke="none" textAnchor="middle">
        <text x={widthMm / 2} y={off - 6 * unit}>
          {round(widthMm)} mm
        </text>
        <text transform={`translate(${off - 6 * unit} ${heightMm / 2}) rotate(-90)`}>
          {round(heightMm)} mm
        </text>
      </g>
    </g>
  );
}
