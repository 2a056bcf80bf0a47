/** One option of the command line: how it is written and what it means. The help text is made from this list. */
interface OptionLine {
  /** what stands for the value in the help; absent for a switch */
  value?: string;
  commands: readonly ('check' | 'prepare')[];
  help: string;
}

const BOTH = ['check', 'prepare'] as const;
const PREPARE = ['prepare'] as const;

export const OPTIONS = {
  'width-mm': {
    value: 'W',
    commands: BOTH,
    help: 'width of the artwork as placed, 1 to 3000 mm. Without it, the size that the file states itself',
  },
  'height-mm': {
    value: 'H',
    commands: BOTH,
    help: 'height as placed, 1 to 3000 mm. Without it, the artwork keeps its proportions',
  },
  spot: {
    value: 'WxH',
    commands: BOTH,
    help: 'the area that the beam marks, width along X by height along Y, each 0.005 to 5 mm; needed',
  },
  'spot-shape': { value: 'SHAPE', commands: BOTH, help: 'ellipse (unless said otherwise) or rectangle' },
  firing: {
    value: 'FIRING',
    commands: BOTH,
    help: 'swept: the beam stays on across the pixel (unless said otherwise); pulsed: one spot a pixel',
  },
  'direction-deg': {
    value: 'D',
    commands: BOTH,
    help: 'angle of the scan lines to X, -180 to 180 degrees; 0 unless said otherwise',
  },
  'pitch-mm': {
    value: 'P',
    commands: BOTH,
    help: "distance between scan lines, 0.01 to 2 mm; the spot's size across the lines unless said otherwise. Also PxQ, along X and along Y, when scanning at 0 or 90 degrees",
  },
  'pitch-along-mm': {
    value: 'Q',
    commands: BOTH,
    help: 'distance between pixels along a line, 0.01 to 2 mm; as the line pitch unless said otherwise',
  },
  treatment: {
    value: 'T',
    commands: BOTH,
    help: 'linework (lines are followed), solid (filled, two levels), halftone (screened dots) or continuous (power levels). prepare needs it; check suggests one',
  },
  'quarter-turns': {
    value: 'N',
    commands: BOTH,
    help: 'quarter turns clockwise that the artwork is placed with, 0 to 3',
  },
  'dividing-lstar': {
    value: 'L',
    commands: BOTH,
    help: 'lightness L* that parts burned from unburned in linework and solid, 1 to 99; 53.4 unless said otherwise',
  },
  'blank-mm': {
    value: 'WxH',
    commands: BOTH,
    help: 'the blank, each side 5 to 3000 mm; the artwork lies in its middle',
  },
  screen: { value: 'NAME', commands: PREPARE, help: 'halftone method, see below' },
  tone: {
    value: 'MODE',
    commands: PREPARE,
    help: 'absolute: coverage = 1 - relative luminance (unless said otherwise); scaled: into the reachable range',
  },
  'black-point': {
    value: 'Y',
    commands: PREPARE,
    help: 'relative luminance that becomes full burn, 0 to 0.95',
  },
  'white-point': {
    value: 'Y',
    commands: PREPARE,
    help: 'relative luminance that stays untouched, 0.05 to 1, above the black point',
  },
  gamma: {
    value: 'G',
    commands: PREPARE,
    help: 'exponent on the lightness between the points, 0.2 to 5; above 1 darkens',
  },
  'perpendicular-pitch-mm': {
    value: 'P',
    commands: PREPARE,
    help: 'adds a second pass at +90 degrees with this line pitch, 0.01 to 2 mm',
  },
  corners: {
    value: 'HOW',
    commands: PREPARE,
    help: 'corners of traced outlines: kept (unless said otherwise) or eased',
  },
  mirror: { commands: PREPARE, help: 'left and right exchanged, for the back of clear stock' },
  formats: {
    value: 'LIST',
    commands: PREPARE,
    help: 'raster files to write, joined by commas: png,tiff,bmp unless said otherwise. Linework is always written as SVG and PDF',
  },
  label: {
    value: 'NAME',
    commands: PREPARE,
    help: "first part of the file names; the artwork's own name unless said otherwise",
  },
  out: {
    value: 'DIR',
    commands: PREPARE,
    help: 'folder for the files, report.json and manifest.json; made where it is missing; needed',
  },
  pictures: { commands: PREPARE, help: 'also writes the five pictures from sent to burned' },
  json: { commands: BOTH, help: 'prints exactly one JSON object and nothing else on standard output' },
  timings: { commands: BOTH, help: 'prints milliseconds of every stage on standard error' },
  help: { commands: BOTH, help: 'prints this' },
} as const satisfies Record<string, OptionLine>;
export type OptionName = keyof typeof OPTIONS;

export const takesValue = (name: OptionName): boolean => 'value' in OPTIONS[name];
export const isOption = (name: string): name is OptionName => Object.hasOwn(OPTIONS, name);
