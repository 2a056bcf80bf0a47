import type { CautionId, Route, Stock } from './stock';

/** A safety notice: short, plain, never legal advice; never a severity. */
export interface Caution {
  id: CautionId;
  title: string;
  text: string;
}

/** How every caution ends: who knows better than this program. */
const DEFER = 'The machine’s manual, local codes and a qualified laser safety officer decide.';

const TEXTS: Record<CautionId, { title: string; text: string }> = {
  'machine-class': {
    title: 'Laser safety class',
    text: 'By the product standard IEC 60825-1 a machine’s class holds only with covers and interlocks in place; an open frame is class 4. Wear eye protection for the wavelength, never leave a running laser, keep an extinguisher at hand and lead the fumes outside.',
  },
  chlorinated: {
    title: 'Chlorinated plastic',
    text: 'By chemistry and common trade practice PVC, vinyl and other chlorinated plastics give off hydrogen chloride, which harms people and machines. They are never engraved here.',
  },
  'unidentified-plastic': {
    title: 'Unidentified plastic',
    text: 'By common trade practice a plastic is not engraved until its maker’s data sheet says what it is: it may be chlorinated.',
  },
  'chrome-tanned-leather': {
    title: 'Chrome-tanned leather',
    text: 'By common trade practice chrome-tanned leather is not engraved, because its fumes and ash can hold harmful chromium. Ask the supplier how it was tanned.',
  },
  'glued-board': {
    title: 'Glued board',
    text: 'By makers’ data sheets the glues of MDF and plywood give off formaldehyde and other fumes when burned, and glue lines burn unevenly. Use full extraction.',
  },
  'treated-wood': {
    title: 'Treated or painted wood',
    text: 'By makers’ data sheets preservative and paint can give off toxic fumes when burned. Find out what the wood was treated with first.',
  },
  reflective: {
    title: 'Reflective stock',
    text: 'By the product standard IEC 60825-1 a reflected beam is as dangerous as the beam itself. Keep the covers closed and the piece flat.',
  },
  'wet-finish': {
    title: 'Wet solvent finish',
    text: 'By makers’ data sheets a solvent finish that is not fully dry can catch fire under the beam. Let it cure first.',
  },
  'oily-rags': {
    title: 'Oily rags',
    text: 'By fire-safety guidance rags with drying oil can set themselves alight. Spread them to dry outside or keep them in a closed metal bin.',
  },
  'darkening-wash': {
    title: 'Darkening wash',
    text: 'By its safety data sheet the wash must be fully dry before engraving, needs extraction, and smudges without a clear coat. It is not food-safe and not for a child’s article.',
  },
  'food-contact': {
    title: 'Contact with food',
    text: 'By common trade practice a burned surface that touches food is cleaned and sealed with a finish whose maker states that it is safe for food.',
  },
};

/** The caution in full, ending with whom to ask. */
export function cautionOf(id: CautionId): Caution {
  const { title, text } = TEXTS[id];
  return { id, title, text: `${text} ${DEFER}` };
}

/**
 * The cautions that apply to a piece of work, each once: those of the stock, the route and the use, and for the people at
 * the machine its class.
 * @param stock null while it is not identified
 * @param atMachine whether the reader will stand at the machine
 */
export function cautionsFor(
  stock: Pick<Stock, 'cautions'> | null,
  route: Route,
  use: 'decoration' | 'touches-food' | 'for-a-child' | 'outdoors',
  atMachine: boolean,
): Caution[] {
  const ids: CautionId[] = [
    ...(atMachine ? (['machine-class'] as const) : []),
    ...(stock ? stock.cautions : (['unidentified-plastic'] as const)),
    ...(route === 'darkening-wash' ? (['darkening-wash'] as const) : []),
    ...(use === 'touches-food' ? (['food-contact'] as const) : []),
  ];
  return [...new Set(ids)].map(cautionOf);
}

/** Why a route cannot be used for a purpose, or null where it can. */
export function routeRefusal(
  stock: Pick<Stock, 'name' | 'routes'> | null,
  route: Route,
  use: 'decoration' | 'touches-food' | 'for-a-child' | 'outdoors',
): string | null {
  if (route === 'darkening-wash' && use === 'touches-food') {
    return 'The darkening wash is not food-safe. Choose another route, or another use.';
  }
  if (route === 'darkening-wash' && use === 'for-a-child') {
    return 'The darkening wash is not for a child’s article. Choose another route, or another use.';
  }
  if (stock && !stock.routes.includes(route)) {
    return `${ROUTE_WORDS[route]} is not offered on ${stock.name}. Choose another route or another stock.`;
  }
  return null;
}

export const ROUTE_WORDS: Record<Route, string> = {
  'bare-burn': 'Bare burn',
  'darkening-wash': 'Darkening wash',
  'paint-fill': 'Paint fill',
};
