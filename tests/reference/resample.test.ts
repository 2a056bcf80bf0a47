import { expect } from 'vitest';
import { codeValues } from '../../src/lib/imaging/srgb';
import { resampleWhole, type Grey, type Light } from '../../src/lib/prepare/resample/upright';
import { referenceCheck } from './check';
import { readTable } from './read-table';

const WHITE = 65_535;
const rows = readTable('resample_values.csv');
const wanted = (name: string, method: string): number => {
  const row = rows.find((found) => found.case === name && found.method === method);
  if (!row) throw new Error(`no row for ${name}, ${method}`);
  return Number(row.value);
};
const codeOf = (sample: number): number => 255 * codeValues()[sample];

/** A stripe of black on white, repeated, that covers the first `share` of every ten columns. */
function stripes(share: number): Grey {
  const per = 3000;
  return {
    width: per,
    height: 1,
    data: Uint16Array.from({ length: per }, (_, x) => (x < share * per ? 0 : WHITE)),
  };
}

const halved = (light: Light): number => {
  const board = Uint16Array.from({ length: 64 * 64 }, (_, i) =>
    ((i % 64) + Math.floor(i / 64)) % 2 === 0 ? 0 : WHITE,
  );
  const { data } = resampleWhole({ width: 64, height: 64, data: board }, 32, 32, light);
  expect(new Set(data).size).toBe(1);
  return codeOf(data[0]);
};

referenceCheck(
  {
    what: 'a checkerboard of single pixels at half size: 187.516 in linear light, 127.5 in code values',
    basis: 'computed',
    source: 'resample_values.csv; IEC 61966-2-1 applied to the mean; libvips 8.14.1 in scRGB gives 188',
    within: '0.01 of 255',
  },
  () => {
    expect(Math.abs(halved('linear') - wanted('1px checkerboard 2:1', 'area, linear light'))).toBeLessThan(
      0.01,
    );
    expect(Math.abs(halved('coverage') - wanted('1px checkerboard 2:1', 'area, gamma-space'))).toBeLessThan(
      0.01,
    );
  },
);

referenceCheck(
  {
    what: 'a black hairline that covers part of a pixel, in linear light and in code values',
    basis: 'computed',
    source: 'resample_values.csv; IEC 61966-2-1 applied to the covered share',
    within: '0.05 of 255',
  },
  () => {
    const cases = rows.filter((row) => row.case.startsWith('black line covering'));
    expect(cases.length).toBeGreaterThan(5);
    for (const row of cases) {
      const printed = Number(/covering ([\d.]+)/.exec(row.case)?.[1]);
      // The table prints a third with three digits.
      const share = printed === 0.333 ? 1 / 3 : printed;
      const light = row.method.startsWith('linear') ? 'linear' : 'coverage';
      const { data } = resampleWhole(stripes(share), 1, 1, light);
      expect(Math.abs(codeOf(data[0]) - Number(row.value)), `${row.case}, ${row.method}`).toBeLessThan(0.05);
    }
  },
);
