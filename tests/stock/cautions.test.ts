import { describe, expect, it } from 'vitest';
import { cautionOf, cautionsFor, routeRefusal } from '@/lib/stock/cautions';
import { cautionIdSchema, routeSchema } from '@/lib/stock/stock';

const USES = ['decoration', 'touches-food', 'for-a-child', 'outdoors'] as const;
const ids = (...args: Parameters<typeof cautionsFor>) => cautionsFor(...args).map(({ id }) => id);

describe('cautionOf', () => {
  it.each(cautionIdSchema.options)('%s names its kind of source first and defers last', (id) => {
    for (const atMachine of [true, false]) {
      const { title, text } = cautionOf(id, atMachine);
      expect(title).not.toBe('');
      expect(text).toMatch(/^According to (the |university |makers’|suppliers’|finish makers’|fire )/);
      expect(text).toMatch(
        /The machine’s manual, local codes and a qualified laser safety officer decide\.$/,
      );
    }
  });

  it.each(cautionIdSchema.options)('%s is no legal advice and gives no optical density', (id) => {
    expect(cautionOf(id, true).text).not.toMatch(/\billegal|\blaw\b|permitted|optical density|\bOD\b/i);
  });

  it('names hydrogen chloride, not chlorine', () => {
    expect(cautionOf('chlorinated', false).text).toContain('hydrogen chloride');
    expect(cautionOf('chlorinated', false).text).not.toContain('chlorine gas');
  });

  it('tells of mixing the wash to staff only', () => {
    expect(cautionOf('darkening-wash', true).text).toContain(
      'borates are classified toxic to reproduction; follow the safety data sheet',
    );
    expect(cautionOf('darkening-wash', false).text).not.toMatch(/mixing|gloves/i);
  });

  it('states the class of an open frame, eye protection, attendance, extinguisher and extraction', () => {
    const { text } = cautionOf('machine-class', true);
    for (const part of [
      'IEC 60825-1',
      'interlocks',
      'class 4',
      'eye protection',
      'Never leave',
      'extinguisher',
      'outside',
    ]) {
      expect(text).toContain(part);
    }
  });
});

describe('cautionsFor', () => {
  it('treats a blank that nobody has identified as plastic of unknown kind', () => {
    expect(ids(null, 'bare-burn', 'decoration', false)).toEqual(['unidentified-plastic']);
  });

  it('puts the class of the machine first for whoever stands at it', () => {
    expect(ids({ cautions: ['glued-board'] }, 'bare-burn', 'decoration', true)).toEqual([
      'machine-class',
      'glued-board',
    ]);
    expect(ids({ cautions: ['glued-board'] }, 'bare-burn', 'decoration', false)).toEqual(['glued-board']);
  });

  it('adds those of the route and of the use, each once', () => {
    expect(ids({ cautions: [] }, 'darkening-wash', 'decoration', false)).toEqual(['darkening-wash']);
    expect(ids({ cautions: ['wet-finish'] }, 'paint-fill', 'touches-food', false)).toEqual([
      'wet-finish',
      'food-contact',
    ]);
    expect(ids({ cautions: [] }, 'bare-burn', 'outdoors', false)).toEqual([]);
  });
});

describe('routeRefusal', () => {
  const every = { name: 'Oak 8 mm', routes: [...routeSchema.options] };

  it.each(routeSchema.options.flatMap((route) => USES.map((use) => [route, use] as const)))(
    '%s for %s',
    (route, use) => {
      const refused = route === 'darkening-wash' && (use === 'touches-food' || use === 'for-a-child');
      expect(routeRefusal(every, route, use) !== null).toBe(refused);
      expect(routeRefusal(null, route, use) !== null).toBe(refused);
    },
  );

  it('refuses a route that the stock does not offer, by name', () => {
    expect(routeRefusal({ name: 'Slate', routes: ['bare-burn'] }, 'paint-fill', 'decoration')).toBe(
      'Paint fill is not offered on Slate. Choose another route or another stock.',
    );
    expect(routeRefusal({ name: 'Vinyl', routes: [] }, 'bare-burn', 'decoration')).toContain(
      'Bare burn is not offered on Vinyl',
    );
  });
});
