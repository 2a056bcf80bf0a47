/** A fern frond, 140 × 68 mm, as SVG: the drawing on the front page, made for nothing else. Its tips are finer than a spot. */
const WIDTH_MM = 140;
const HEIGHT_MM = 68;
const PINNAE = 20;

interface Point {
  x: number;
  y: number;
}

const short = (value: number): number => Number(value.toFixed(2));
const at = ({ x, y }: Point): string => `${short(x)} ${short(y)}`;

function stalk(t: number): Point {
  return {
    x: 5 + 131 * t - 6 * Math.sin(Math.PI * t * 0.9),
    y: 64.5 - 66 * t - 10 * Math.sin(Math.PI * t * 0.95) + 22 * t * t,
  };
}

function heading(t: number): number {
  const a = stalk(t - 0.002);
  const b = stalk(t + 0.002);
  return Math.atan2(b.y - a.y, b.x - a.x);
}

function leaflet(from: Point, angle: number, length: number, width: number): string {
  const [c, s] = [Math.cos(angle), Math.sin(angle)];
  const p = (u: number, v: number) => at({ x: from.x + u * c - v * s, y: from.y + u * s + v * c });
  return (
    `M${p(0, 0)}C${p(length * 0.15, -width)} ${p(length * 0.65, -width * 1.05)} ${p(length, 0)}` +
    `C${p(length * 0.6, width * 0.75)} ${p(length * 0.2, width * 0.8)} ${p(0, 0)}Z`
  );
}

/** A rib narrows along its way: three lengths of falling width. */
function rib(points: readonly Point[], sizeMm: number): string {
  const steps = points.length - 1;
  const cuts = [0, Math.ceil(steps * 0.4), Math.ceil(steps * 0.75), steps];
  return [0.42, 0.26, 0.14]
    .map((width, i) => {
      const path = points
        .slice(cuts[i], cuts[i + 1] + 1)
        .map(at)
        .join('L');
      return `<path d="M${path}" stroke-width="${short(width * (0.7 + sizeMm / 90))}"/>`;
    })
    .join('');
}

function pinna(t: number, side: -1 | 1): { leaflets: string; ribs: string } {
  const along = (t - 0.08) / 0.92;
  const size = 56 * along ** 0.5 * (1 - along) ** 0.95 + 2.2;
  const steps = Math.max(4, Math.round(size / 2.3));
  const bend = side * (side > 0 ? -0.22 : -0.35);
  let angle = heading(t) + side * ((side > 0 ? 1.34 : 1.22) - 0.55 * t);
  let here = stalk(t);
  const points = [here];
  let leaflets = '';
  for (let step = 1; step <= steps; step += 1) {
    angle += bend / steps;
    here = { x: here.x + (size / steps) * Math.cos(angle), y: here.y + (size / steps) * Math.sin(angle) };
    points.push(here);
    const u = step / steps;
    const length =
      (side > 0 ? 0.78 : 0.9) * (3.6 * (1 - u) ** 0.75 + 0.75) * (0.5 + size / 64) * (1 - 0.15 * t);
    const width = Math.max(0.16, length * 0.2);
    const turns = step < steps ? [-(1 - 0.25 * u), 1 - 0.25 * u] : [0];
    for (const turn of turns)
      leaflets += leaflet(here, angle + turn, turn === 0 ? length * 1.2 : length, width);
  }
  return { leaflets, ribs: rib(points, size) };
}

function stalkOutline(): string {
  const sides = Array.from({ length: 61 }, (_, i) => {
    const t = -0.03 + (1.02 * i) / 60;
    const { x, y } = stalk(t);
    const half = 0.8 * (1 - t) ** 1.1 + 0.12;
    const [dx, dy] = [half * Math.sin(heading(t)), half * Math.cos(heading(t))];
    return { up: { x: x - dx, y: y + dy }, down: { x: x + dx, y: y - dy } };
  });
  return `M${[...sides.map(({ up }) => up), ...sides.reverse().map(({ down }) => down)].map(at).join('L')}Z`;
}

export function drawFern(): string {
  let leaflets = '';
  let ribs = '';
  for (let i = 0; i < PINNAE; i += 1) {
    for (const side of [-1, 1] as const) {
      const drawn = pinna(0.12 + 0.81 * (i / (PINNAE - 1)) ** 0.95, side);
      leaflets += drawn.leaflets;
      ribs += drawn.ribs;
    }
  }
  const tip = stalk(0.985);
  for (const turn of [-0.5, 0, 0.5]) {
    const from = { x: tip.x - 0.3 * Math.abs(turn), y: tip.y };
    leaflets += leaflet(from, heading(0.98) + turn, 2.6 - 1.2 * Math.abs(turn), 0.42);
  }
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" width="${WIDTH_MM}mm" height="${HEIGHT_MM}mm" viewBox="0 0 ${WIDTH_MM} ${HEIGHT_MM}">` +
    `<g fill="#000"><path d="${stalkOutline()}"/><path d="${leaflets}"/></g>` +
    `<g fill="none" stroke="#000" stroke-linecap="round" stroke-linejoin="round">${ribs}</g></svg>\n`
  );
}
