import { describe, expect, it } from 'vitest';
import { cautionIdSchema, routeSchema } from '@/lib/stock/stock';
import { cautionOf, cautionsFor, routeRefusal } from '@/lib/stock/cautions';

const USES = ['decoration', 'touches-food', 'for-a-child', 'outdoors'] as const;

describe('cautions', () => {
  it.each(cautionIdSchema.options)('%s names its kind of source and ends by deferring', (id) => {
    const caution = cautionOf(id);
    expect(caution.id).toBe(id);
    expect(caution.title).not.toBe('');
    expect(caution.text).toMatch(/^By /);
    expect(caution.text).toMatch(/manual, local codes and a qualified laser safety officer decide\.$/);
  });

  it('lists those of stock, route and use once each', () => {
    const ids = cautionsFor({ cautions: ['glued-board', 'darkening-wash'] }, 'darkening-wash', 'touches-food', true).map((c) => c.id);
    expect(ids).toEqual(['machine-class', 'glued-board', 'darkening-wash', 'food-contact']);
  });

  it('warns of plastic while the stock is not identified', () => {
    expect(cautionsFor(null, 'bare-burn', 'decoration', false).map((c) => c.id)).toEqual(['unidentified-plastic']);
  });

  it('has nothing to say of plain work on plain stock to a customer', () => {
    expect(cautionsFor({ cautions: [] }, 'bare-burn', 'outdoors', false)).toEqual([]);
  });
});

describe('routes', () => {
  const all = { name: 'Birch plywood', routes: [...routeSchema.options] };

  it.each(routeSchema.options.flatMap((route) => USES.map((use) => [route, use] as const)))('%s for %s', (route, use) => {
    const refused = route === 'darkening-wash' && (use === 'touches-food' || use === 'for-a-child');
    expect(routeRefusal(all, route, use) !== null).toBe(refused);
    expect(routeRefusal(null, route, use) !== null).toBe(refused);
    expect(routeRefusal({ ...all, routes: [] }, route, use)).not.toBeNull();
  });

  it('names the stock that does not offer a route', () => {
    expect(routeRefusal({ name: 'Slate', routes: ['bare-burn'] }, 'paint-fill', 'decoration')).toBe(
      'Paint fill is not offered on Slate. Choose another route or another stock.',
    );
  });
});
