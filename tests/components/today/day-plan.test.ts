import { describe, expect, it } from 'vitest';
import { dayPlan } from '../../../src/components/today/day-plan';
import { orderRow } from '../order-fixtures';

describe('dayPlan', () => {
  const rows = [
    orderRow({
      number: 'U-1001',
      machineName: 'Wren',
      dueOn: '2026-12-09',
      state: 'released',
      scanSeconds: 100,
      quantity: 2,
    }),
    orderRow({
      number: 'U-1002',
      machineName: 'Heron',
      dueOn: '2026-12-03',
      state: 'released',
      scanSeconds: 60,
      quantity: 1,
    }),
    orderRow({
      number: 'U-1003',
      machineName: 'Heron',
      dueOn: null,
      state: 'released',
      scanSeconds: null,
      quantity: 4,
    }),
    orderRow({
      number: 'U-1004',
      machineName: 'Heron',
      dueOn: '2026-12-20',
      state: 'running',
      scanSeconds: 40,
      quantity: 1,
    }),
  ];
  it('puts what runs first, then by due date, those without one last', () => {
    const [heron, wren] = dayPlan(rows);
    expect(heron.rows.map((r) => r.number)).toEqual(['U-1004', 'U-1002', 'U-1003']);
    expect(wren.rows.map((r) => r.number)).toEqual(['U-1001']);
  });
  it('sums the time of all pieces, and says where it is only the least', () => {
    const [heron, wren] = dayPlan(rows);
    expect(heron).toMatchObject({ seconds: 100, isLeast: true });
    expect(wren).toMatchObject({ seconds: 200, isLeast: false });
  });
  it('is empty when there is nothing', () => expect(dayPlan([])).toEqual([]));
});
