import type { CSSProperties, ReactNode } from 'react';
import type { Finding } from '@/lib/preflight/finding';
import { DimensionLine } from './DimensionLine';
import { Places } from './Places';
import { Rule } from './Rule';

interface Props {
  /** address of the picture; without it `children` are the picture */
  src?: string | null;
  alt: string;
  widthMm: number;
  heightMm: number;
  unit?: 'mm' | 'in';
  linePitchMm?: number | null;
  /** turns clockwise that the picture, but not the places, still lacks */
  quarterTurns?: 0 | 1 | 2 | 3;
  findings?: readonly Finding[];
  lit?: string | null;
  onLit?: (findingId: string | null) => void;
  /** a new result is laid down from the top, once */
  laidDown?: boolean;
  children?: ReactNode;
}

const MAX_HEIGHT_PX = 560;

/** The artwork in its well, its size as dimension lines, the rule under it. */
export function Plate({
  src,
  alt,
  widthMm,
  heightMm,
  unit,
  linePitchMm,
  quarterTurns = 0,
  findings = [],
  lit = null,
  onLit,
  laidDown = false,
  children,
}: Props) {
  const aspect = widthMm / heightMm;
  const size = { width: `min(100%, ${Math.round(MAX_HEIGHT_PX * aspect)}px)` };
  return (
    <div>
      <div className="plate-well">
        <div className="plate-picture" style={size}>
          <div className="absolute inset-x-0 top-[-28px]">
            <DimensionLine lengthMm={widthMm} along="x" unit={unit} />
          </div>
          <div className="absolute inset-y-0 left-[-28px] w-[18px]">
            <DimensionLine lengthMm={heightMm} along="y" unit={unit} />
          </div>
          <div
            className={`relative w-full overflow-hidden bg-[#fff] ${laidDown ? 'laid-down' : ''}`}
            style={{ aspectRatio: `${widthMm} / ${heightMm}` }}
          >
            {src ? (
              <img
                src={src}
                alt={alt}
                className="absolute left-1/2 top-1/2 max-w-none"
                style={turned(quarterTurns, aspect)}
              />
            ) : (
              children
            )}
          </div>
          <Places findings={findings} widthMm={widthMm} heightMm={heightMm} lit={lit} onLit={onLit} />
        </div>
      </div>
      <div className="flex justify-center overflow-hidden px-[44px] pt-2">
        <div style={size}>
          <Rule widthMm={widthMm} linePitchMm={linePitchMm} />
        </div>
      </div>
    </div>
  );
}

/** The picture is as wide as it will lie: a quarter turn swaps its sides before it turns. */
function turned(quarterTurns: number, aspect: number): CSSProperties {
  const odd = quarterTurns % 2 === 1;
  return {
    width: `${odd ? 100 / aspect : 100}%`,
    height: `${odd ? 100 * aspect : 100}%`,
    transform: `translate(-50%, -50%) rotate(${90 * quarterTurns}deg)`,
  };
}
