import { sizeAcross, type Spot } from '../machines/spot';
import type { ScreenName, Treatment } from '../prepare/settings';
import type { Design } from './views';

/** The choices that the instruction offers, each opened by its own word. */
export const CHOICES = [
  'treatment',
  'screen',
  'dividing-level',
  'corners',
  'line-pitch',
  'direction',
  'passes',
  'tone',
  'mirror',
  'machine',
  'recipe',
] as const;
export type ChoiceId = (typeof CHOICES)[number];

/** A stretch of the instruction; with a choice where the words can be chosen. */
export interface SentencePart {
  text: string;
  choice: ChoiceId | null;
}

/** What the words need beside the designer's choices. */
export interface SentenceContext {
  machineName: string;
  spot: Spot;
  /** null: no stock named */
  stockName: string | null;
  /** unit that the machine shows speeds in */
  speedUnit: 'mm/s' | 'mm/min';
}

export const SCREEN_WORDS: Record<ScreenName, string> = {
  'even-grain': 'even grain',
  'published:floyd-steinberg-1976': 'Floyd–Steinberg 1976',
  'published:jarvis-judice-ninke-1976': 'Jarvis–Judice–Ninke 1976',
  'published:stucki-1981': 'Stucki 1981',
  'published:bayer-1973': 'Bayer 1973',
};

export const TREATMENT_WORDS: Record<Treatment, string> = {
  linework: 'linework',
  solid: 'solid',
  halftone: 'halftone',
  continuous: 'continuous tone',
};

/** 0.11 is written 0.110 mm: a pitch always has three decimals. */
export const pitchWords = (pitchMm: number): string => `${pitchMm.toFixed(3)} mm`;

/** 0.07 × 0.11 mm, with as many decimals as the sides need, at least two. */
export function spotWords(spot: Pick<Spot, 'widthMm' | 'heightMm'>): string {
  const side = (mm: number): string => mm.toFixed(Math.abs(mm * 100 - Math.round(mm * 100)) < 1e-6 ? 2 : 3);
  return `${side(spot.widthMm)} × ${side(spot.heightMm)} mm`;
}

/** An angle without needless decimals and with a true minus: −45°. */
export const angleWords = (deg: number): string =>
  `${deg < 0 ? '−' : ''}${Number(Math.abs(deg).toFixed(2))}°`;

export function speedWords(speedMmPerS: number, unit: SentenceContext['speedUnit']): string {
  const value = unit === 'mm/min' ? speedMmPerS * 60 : speedMmPerS;
  const digits = Number(value.toFixed(value < 10 ? 2 : 1));
  return `${String(digits).replace(/\B(?=(\d{3})+(?!\d))/g, ',')} ${unit}`;
}

export function toneWords(tone: Design['tone']): string {
  const words: string[] = [tone.mode];
  const percent = (ratio: number): string => `${Number((ratio * 100).toFixed(1))} %`;
  if (tone.blackPoint !== 0) words.push(`black point ${percent(tone.blackPoint)}`);
  if (tone.whitePoint !== 1) words.push(`white point ${percent(tone.whitePoint)}`);
  if (tone.gamma !== 1) words.push(`gamma ${tone.gamma.toFixed(2)}`);
  return words.join(', ');
}

export function passesWords(design: Pick<Design, 'perpendicular'>): string {
  return design.perpendicular
    ? `two passes, the second perpendicular at ${pitchWords(design.perpendicular.linePitchMm)}`
    : 'one pass';
}

export function recipeWords(design: Pick<Design, 'recipe'>, unit: SentenceContext['speedUnit']): string {
  const { recipe } = design;
  if (!recipe) return 'power and speed not yet typed';
  const focus =
    recipe.focusOffsetMm === 0
      ? 'in focus'
      : `${Number(Math.abs(recipe.focusOffsetMm).toFixed(2))} mm ${recipe.focusOffsetMm > 0 ? 'above' : 'below'} focus`;
  const first = `${recipe.powerPercent} % power, ${speedWords(recipe.speedMmPerS, unit)}`;
  const second = recipe.perpendicular
    ? `, then ${recipe.perpendicular.powerPercent} %, ${speedWords(recipe.perpendicular.speedMmPerS, unit)}`
    : '';
  return `${first}${second}, ${focus}`;
}

const plain = (text: string): SentencePart => ({ text, choice: null });
const word = (choice: ChoiceId, text: string): SentencePart => ({ text, choice });

function treatmentParts(design: Design): SentencePart[] {
  const treatment = word('treatment', TREATMENT_WORDS[design.treatment]);
  const divided = [
    plain(', parted at '),
    word('dividing-level', `L* ${Number(design.dividingLstar.toFixed(1))}`),
  ];
  switch (design.treatment) {
    case 'linework':
      return [
        plain('Follow as '),
        treatment,
        ...divided,
        plain(', corners '),
        word('corners', design.corners),
      ];
    case 'solid':
      return [plain('Fill as '), treatment, ...divided];
    case 'halftone':
      return [plain('Screen as '), treatment, plain(' with '), word('screen', SCREEN_WORDS[design.screen])];
    case 'continuous':
      return [plain('Burn as '), treatment];
  }
}

function scanParts(design: Design): SentencePart[] {
  if (design.treatment === 'linework') return [];
  const tone = design.treatment === 'solid' ? [] : [plain(', tone '), word('tone', toneWords(design.tone))];
  return [
    plain(', lines '),
    word('line-pitch', pitchWords(design.scan.linePitchMm)),
    plain(' apart, scanning at '),
    word('direction', angleWords(design.scan.directionDeg)),
    plain(', '),
    word('passes', passesWords(design)),
    ...tone,
  ];
}

/** The instruction as stretches of text in reading order; a choice stands on every word that can be chosen. */
export function instructionParts(design: Design, context: SentenceContext): SentencePart[] {
  return [
    ...treatmentParts(design),
    ...scanParts(design),
    plain(', '),
    word('mirror', design.mirror ? 'mirrored' : 'not mirrored'),
    plain('. Run on '),
    word('machine', `${context.machineName} with the ${spotWords(context.spot)} spot`),
    plain(context.stockName ? `, on ${context.stockName}, at ` : ' at '),
    word('recipe', recipeWords(design, context.speedUnit)),
    plain('.'),
  ];
}

/** The instruction as plain text: what the ticket, the proof and the mails say. */
export function instructionSentence(design: Design, context: SentenceContext): string {
  return instructionParts(design, context)
    .map((part) => part.text)
    .join('');
}

/** Choices whose words differ between two sets of choices, in the order of the sentence. */
export function changedChoices(before: Design, after: Design, context: SentenceContext): ChoiceId[] {
  const values = (design: Design): Record<ChoiceId, unknown> => ({
    treatment: design.treatment,
    screen: design.screen,
    'dividing-level': design.dividingLstar,
    corners: design.corners,
    'line-pitch': [design.scan.linePitchMm, design.scan.alongPitchMm],
    direction: design.scan.directionDeg,
    passes: design.perpendicular,
    tone: toneWords(design.tone),
    mirror: design.mirror,
    machine: [design.machineId, design.spotPresetId],
    recipe: recipeWords(design, context.speedUnit),
  });
  const [was, is] = [values(before), values(after)];
  return CHOICES.filter((choice) => JSON.stringify(was[choice]) !== JSON.stringify(is[choice]));
}

/** The choices with one of them as it was before; the others unchanged. */
export function putBack(choice: ChoiceId, before: Design, after: Design): Design {
  switch (choice) {
    case 'treatment':
      return { ...after, treatment: before.treatment };
    case 'screen':
      return { ...after, screen: before.screen };
    case 'dividing-level':
      return { ...after, dividingLstar: before.dividingLstar };
    case 'corners':
      return { ...after, corners: before.corners };
    case 'line-pitch':
      return { ...after, scan: { ...before.scan, directionDeg: after.scan.directionDeg } };
    case 'direction':
      return { ...after, scan: { ...after.scan, directionDeg: before.scan.directionDeg } };
    case 'passes':
      return { ...after, perpendicular: before.perpendicular };
    case 'tone':
      return { ...after, tone: before.tone };
    case 'mirror':
      return { ...after, mirror: before.mirror };
    case 'machine':
      return { ...after, machineId: before.machineId, spotPresetId: before.spotPresetId };
    case 'recipe':
      return { ...after, recipe: before.recipe };
  }
}

/** What a pitch means for a spot: its ratio to the size across, and whether lines overlap, touch or part. */
export function pitchConsequence(
  spot: Spot,
  directionDeg: number,
  linePitchMm: number,
): { ratio: number; sizeAcrossMm: number; words: string } {
  const across = sizeAcross(spot, directionDeg);
  const ratio = linePitchMm / across;
  const differenceMm = Math.abs(linePitchMm - across);
  if (differenceMm < 0.0005) return { ratio, sizeAcrossMm: across, words: 'lines touch' };
  const words = `lines ${ratio < 1 ? 'overlap' : 'part'} by ${differenceMm.toFixed(3)} mm`;
  return { ratio, sizeAcrossMm: across, words };
}
