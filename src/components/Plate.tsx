import type { ReactNode } from 'react';
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
            className={`w-full bg-[#fff] ${laidDown ? 'laid-down' : ''}`}
            style={{ aspectRatio: `${widthMm} / ${heightMm}` }}
          >
            {src ? <img src={src} alt={alt} className="block h-full w-full" /> : children}
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
