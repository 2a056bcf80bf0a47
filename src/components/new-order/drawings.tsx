import type { ReactNode } from 'react';
import type { Blank, DATUMS } from '@/lib/orders/order';
import type { Treatment } from '@/lib/prepare/settings';

const LINE = { fill: 'none', stroke: 'currentColor', strokeWidth: 1.5 } as const;

function Drawing({ children, wide = false }: { children: ReactNode; wide?: boolean }) {
  return (
    <svg
      viewBox={wide ? '0 0 96 40' : '0 0 48 32'}
      aria-hidden="true"
      className={wide ? 'h-[48px] w-full text-ink' : 'h-[36px] w-[54px] text-ink'}
      preserveAspectRatio="xMinYMid meet"
    >
      {children}
    </svg>
  );
}

export function OutlineDrawing({ outline }: { outline: Blank['outline'] }) {
  return (
    <Drawing>
      {outline === 'rectangle' && <rect x="3" y="4" width="42" height="24" {...LINE} />}
      {outline === 'round' && <circle cx="24" cy="16" r="13" {...LINE} />}
      {outline === 'own' && (
        <path d="M6 24 C2 10 16 2 24 8 S44 4 44 16 S32 30 24 25 S9 31 6 24 Z" {...LINE} />
      )}
    </Drawing>
  );
}

export function DatumDrawing({ datum }: { datum: (typeof DATUMS)[number] }) {
  const x = datum === 'centre' ? 24 : datum.endsWith('right') ? 43 : 5;
  const y = datum === 'centre' ? 16 : datum.startsWith('bottom') ? 28 : 4;
  return (
    <Drawing>
      <rect x="5" y="4" width="38" height="24" {...LINE} strokeWidth="1" />
      <circle cx={x} cy={y} r="3.5" fill="currentColor" />
    </Drawing>
  );
}

/** The same leaf four times: followed, filled, in dots, in greys. */
const LEAF = 'M8 32 C20 6 60 2 88 10 C72 34 32 40 8 32 Z';
const RIB = 'M8 32 C34 26 62 18 88 10';

export function TreatmentDrawing({ treatment }: { treatment: Treatment }) {
  return (
    <Drawing wide>
      {treatment === 'linework' && (
        <g {...LINE}>
          <path d={LEAF} />
          <path d={RIB} />
          <path d="M30 27 C32 20 38 14 46 10 M46 23 C48 16 54 11 62 8 M34 26 C42 30 50 32 56 31 M52 21 C58 24 66 25 72 23" />
        </g>
      )}
      {treatment === 'solid' && (
        <path d={`${LEAF} ${RIB} C62 20 34 28 8 32 Z`} fill="currentColor" fillRule="evenodd" />
      )}
      {treatment === 'halftone' && <Dots />}
      {treatment === 'continuous' && <Greys />}
    </Drawing>
  );
}

/** Whether a point lies in the leaf, near enough for a drawing. */
function inLeaf(x: number, y: number): boolean {
  const along = (x - 8) / 80;
  if (along <= 0 || along >= 1) return false;
  const spine = 32 - 22 * along;
  const half = 13 * Math.sin(Math.PI * along) ** 0.8;
  return Math.abs(y - spine + 1) < half;
}

function Dots() {
  const dots = [];
  for (let row = 0; row < 10; row += 1) {
    for (let column = 0; column < 23; column += 1) {
      const x = 4 + column * 4 + (row % 2) * 2;
      const y = 3 + row * 3.8;
      const size = 0.5 + 1.6 * (1 - (x - 8) / 80);
      if (inLeaf(x, y)) dots.push(<circle key={`${x}-${y}`} cx={x} cy={y} r={size} />);
    }
  }
  return <g fill="currentColor">{dots}</g>;
}

function Greys() {
  return (
    <g>
      <defs>
        <linearGradient id="leaf-greys">
          <stop offset="0" stopColor="currentColor" />
          <stop offset="1" stopColor="currentColor" stopOpacity="0.15" />
        </linearGradient>
      </defs>
      <path d={LEAF} fill="url(#leaf-greys)" />
    </g>
  );
}
