import { existsSync } from 'node:fs';
import { expect, test } from 'vitest';
import plate from '@/components/front/fern-plate.json';
import { findingSchema } from '@/lib/preflight/finding';

test('the plate of the front page is what a check answers, and its picture is there', () => {
  const findings = findingSchema.array().min(1).parse(plate.findings);
  for (const { places } of findings) {
    for (const place of places) {
      expect(place.xMm).toBeLessThanOrEqual(plate.widthMm);
      expect(place.yMm).toBeLessThanOrEqual(plate.heightMm);
    }
  }
  expect(existsSync('public/front/fern-burned.webp')).toBe(true);
});
