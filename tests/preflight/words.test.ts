import { expect, test } from 'vitest';
import { counted, listed, mm, roundUpMm } from '../../src/lib/preflight/words';

test.each([
  [0.04, '0.04 mm'],
  [0.0423, '0.042 mm'],
  [0.1, '0.1 mm'],
  [0.996, '1 mm'],
  [12.345, '12.35 mm'],
])('%s mm is said as %s', (value, text) => {
  expect(mm(value)).toBe(text);
});

test.each([
  [12.01, '12.1 mm'],
  [12, '12 mm'],
  [61.7, '62 mm'],
  [62, '62 mm'],
  [130.2, '131 mm'],
])('%s mm is enough with %s', (value, text) => {
  expect(roundUpMm(value)).toBe(text);
});

test('counts and lists', () => {
  expect(counted(1, 'gap')).toBe('1 gap');
  expect(counted(3, 'gap')).toBe('3 gaps');
  expect(listed([])).toBe('');
  expect(listed(['a'])).toBe('a');
  expect(listed(['a', 'b', 'c'])).toBe('a, b and c');
});
