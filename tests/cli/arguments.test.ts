import { expect, test } from 'vitest';
import { readArguments } from '../../src/cli/arguments';
import { UsageError } from '../../src/cli/usage-error';

test('a command, its artwork, values and switches', () => {
  const typed = readArguments(['check', 'logo.svg', '--width-mm', '60', '--spot', '0.07x0.11', '--json']);
  expect(typed).toEqual({
    command: 'check',
    artwork: 'logo.svg',
    values: { 'width-mm': '60', spot: '0.07x0.11' },
    switches: new Set(['json']),
  });
});

test('options may stand before the artwork, and values may follow an equals sign', () => {
  const typed = readArguments(['prepare', '--mirror', '--tone=scaled', 'logo.svg', '--out', 'here']);
  expect(typed).toMatchObject({
    command: 'prepare',
    artwork: 'logo.svg',
    values: { tone: 'scaled', out: 'here' },
  });
  expect(typed?.switches.has('mirror')).toBe(true);
});

test('a negative number is a value', () => {
  const typed = readArguments(['check', 'a.png', '--direction-deg', '-45', '--spot', '0.1x0.1']);
  expect(typed?.values['direction-deg']).toBe('-45');
});

test.each([[['--help']], [['check', '--help']], [['help']]])('%j asks for the help text', (argv) => {
  expect(readArguments(argv)).toBeNull();
});

test.each([
  [[], 'check or prepare'],
  [['burn', 'a.png'], '"burn"'],
  [['check'], 'needs the path'],
  [['check', 'a.png', 'b.png'], '"b.png"'],
  [['check', 'a.png', '--colour', 'red'], '--colour'],
  [['check', 'a.png', '--width-mm'], '--width-mm'],
  [['check', 'a.png', '--json=yes'], '--json'],
  [['check', 'a.png', '--out', 'x'], '--out belongs to prepare'],
])('%j is refused and the message names %s', (argv, words) => {
  expect(() => readArguments(argv)).toThrow(UsageError);
  expect(() => readArguments(argv)).toThrow(words);
});
