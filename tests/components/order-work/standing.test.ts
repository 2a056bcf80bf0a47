import { describe, expect, it } from 'vitest';
import { choiceContext } from '../../../src/components/sentence/context';
import { standingOf } from '../../../src/components/order-work/standing';
import { design, findings, machine, orderView, preparation } from '../order-fixtures';

const standing = (changes = {}, chosen = design) => {
  const order = orderView(changes);
  return standingOf(order, chosen, choiceContext(chosen, [machine], order));
};

describe('standingOf', () => {
  it('is as asked when artwork, size and choices are those of the preparation', () => {
    expect(standing()).toMatchObject({
      isOpen: true,
      isStale: false,
      findings,
      size: { widthMm: 90, heightMm: 60 },
    });
  });
  it('is stale after a changed choice, another size, or newer artwork', () => {
    expect(standing({}, { ...design, mirror: true }).isStale).toBe(true);
    const order = orderView();
    expect(standing({ fields: { ...order.fields, widthMm: 100 } }).isStale).toBe(true);
    const newer = { ...order.artworks[0], version: 3, check: null };
    expect(standing({ artworks: [...order.artworks, newer] })).toMatchObject({
      isStale: true,
      finished: null,
      findings: null,
    });
  });
  it('asks for a first preparation, and for none once the order runs', () => {
    expect(standing({ preparations: [] }).isStale).toBe(true);
    expect(standing({ preparations: [], state: 'running' })).toMatchObject({ isOpen: false, isStale: false });
  });
  it('keeps showing the last finished one while a new one is under way', () => {
    const running = {
      ...preparation,
      id: 32,
      report: null,
      task: { state: 'running' as const, stage: 'Screening', progress: 0.4, problem: '' },
    };
    expect(standing({ preparations: [running, preparation] })).toMatchObject({
      latest: { id: 32 },
      finished: { id: 31 },
    });
  });
});
