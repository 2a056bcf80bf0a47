import type { CautionId, Route, Stock } from './stock';

/** A safety notice: short, plain, never legal advice, never a severity. */
export interface Caution {
  id: CautionId;
  title: string;
  text: string;
}

type Use = 'decoration' | 'touches-food' | 'for-a-child' | 'outdoors';

interface Notice {
  title: string;
  /** on whose word, as a kind of source: never a claim of law */
  source: string;
  text: string;
  /** for those who stand at the machine or mix the wash, and for nobody else */
  staffText?: string;
}

/** How every caution ends: who knows better than this program. */
const DEFER = 'The machine’s manual, local codes and a qualified laser safety officer decide.';

const NOTICES: Record<CautionId, Notice> = {
  'machine-class': {
    title: 'The machine’s safety class',
    source: 'the product standard IEC 60825-1 and university safety offices',
    text: 'the machine’s safety class holds only with all covers and interlocks in place, and an open frame counts as class 4. Wear eye protection made for the wavelength. Never leave a running laser; keep an extinguisher at hand, and lead the fumes outside.',
  },
  chlorinated: {
    title: 'Chlorinated plastic',
    source: 'university safety offices',
    text: 'PVC, vinyl and any other chlorinated plastic give off hydrogen chloride under the beam, which harms lungs and machines. They are never engraved here.',
  },
  'unidentified-plastic': {
    title: 'Unidentified material',
    source: 'university safety offices',
    text: 'no plastic is put under a laser before its maker’s safety data sheet says what it is: it may be chlorinated. It waits until it is identified.',
  },
  'chrome-tanned-leather': {
    title: 'Chrome-tanned leather',
    source: 'suppliers’ safety data sheets',
    text: 'the smoke and ash of chrome-tanned leather can hold harmful chromium. Ask the supplier how it was tanned, and use vegetable-tanned leather instead.',
  },
  'glued-board': {
    title: 'Glued board',
    source: 'makers’ safety data sheets and university safety offices',
    text: 'the glues of plywood and MDF give off formaldehyde and other fumes when they burn. Run the extraction at full, and let the piece air afterwards.',
  },
  'treated-wood': {
    title: 'Treated or painted wood',
    source: 'makers’ safety data sheets',
    text: 'preservatives and paints can give off poisonous fumes when they burn. Find out what the wood was treated with; without an answer it is not engraved.',
  },
  reflective: {
    title: 'Reflective stock',
    source: 'the product standard IEC 60825-1',
    text: 'a beam thrown back by a shining surface is as dangerous as the beam itself. Keep the covers closed, and lay the piece flat.',
  },
  'wet-finish': {
    title: 'Wet finish',
    source: 'makers’ safety data sheets',
    text: 'a finish or paint with solvent that is not fully dry can catch fire under the beam. Let it cure for as long as its maker says.',
  },
  'oily-rags': {
    title: 'Oily rags',
    source: 'fire services',
    text: 'rags with drying oil can set themselves alight. Lay them out flat to dry outside, or keep them under water in a closed metal bin.',
  },
  'darkening-wash': {
    title: 'Darkening wash',
    source: 'the safety data sheets of borates, which are classified toxic to reproduction',
    text: 'a washed piece is not for food and not for a child. It smudges until it has a clear coat.',
    staffText:
      'Mixing is for staff only: borates are classified toxic to reproduction; follow the safety data sheet. Gloves, ventilation, away from children; fully dry before engraving, extraction on.',
  },
  'food-contact': {
    title: 'Contact with food',
    source: 'finish makers’ food-contact declarations',
    text: 'a burned surface by itself is not tested for food. It needs a finish whose maker declares it fit for contact with food, cured as the maker says.',
  },
};

/**
 * A caution in full: its kind of source first, whom to ask last.
 * @param id which caution
 * @param atMachine whether the reader stands at the machine; mixing is told to nobody else
 * @example cautionOf('reflective', true).text // 'According to the product standard IEC 60825-1 a beam thrown back …'
 */
export function cautionOf(id: CautionId, atMachine: boolean): Caution {
  const { title, source, text, staffText } = NOTICES[id];
  const parts = [`According to ${source}, ${text}`, atMachine && staffText, DEFER];
  return { id, title, text: parts.filter(Boolean).join(' ') };
}

/**
 * The cautions that apply to a piece of work, each once: those at the machine, of the stock, of the route and of the use.
 * @param stock null while it is not identified; unchanged
 * @param atMachine whether the reader will stand at the machine
 * @returns in a fixed order, the machine's class first; empty where nothing applies
 * @example cautionsFor(null, 'bare-burn', 'decoration', false).map((c) => c.id) // ['unidentified-plastic']
 */
export function cautionsFor(
  stock: Pick<Stock, 'cautions'> | null,
  route: Route,
  use: Use,
  atMachine: boolean,
): Caution[] {
  const ids: CautionId[] = [
    ...(atMachine ? (['machine-class'] as const) : []),
    ...(stock ? stock.cautions : (['unidentified-plastic'] as const)),
    ...(route === 'darkening-wash' ? (['darkening-wash'] as const) : []),
    ...(route === 'paint-fill' ? (['wet-finish'] as const) : []),
    ...(use === 'touches-food' ? (['food-contact'] as const) : []),
  ];
  return [...new Set(ids)].map((id) => cautionOf(id, atMachine));
}

export const ROUTE_WORDS: Record<Route, string> = {
  'bare-burn': 'Bare burn',
  'darkening-wash': 'Darkening wash',
  'paint-fill': 'Paint fill',
};

/**
 * Why a route cannot be used on a stock for a purpose, in words that say what to do; null where it can.
 * @param stock null while it is not identified: then only the use is looked at
 * @example routeRefusal(null, 'darkening-wash', 'touches-food') // 'The darkening wash is not food-safe. …'
 */
export function routeRefusal(
  stock: Pick<Stock, 'name' | 'routes'> | null,
  route: Route,
  use: Use,
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
