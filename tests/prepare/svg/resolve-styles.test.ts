import { describe, expect, test } from 'vitest';
import { parseXml } from '../../../src/lib/prepare/svg/parse-xml';
import { resolveStyles } from '../../../src/lib/prepare/svg/resolve-styles';

/** Fill of the element with id x. */
function fillOfX(inner: string): string | undefined {
  const { root } = parseXml(`<svg viewBox="0 0 9 9">${inner}</svg>`);
  for (const [node, style] of resolveStyles(root).styles) if (node.attributes.id === 'x') return style.fill;
  throw new Error('no element x');
}

describe('resolveStyles', () => {
  test('a presentation attribute stands lowest, the own style highest', () => {
    expect(fillOfX('<rect id="x" fill="red"/>')).toBe('red');
    expect(fillOfX('<style>rect{fill:blue}</style><rect id="x" fill="red"/>')).toBe('blue');
    expect(fillOfX('<style>#x{fill:blue}</style><rect id="x" fill="red" style="fill:lime"/>')).toBe('lime');
    expect(fillOfX('<style>rect{fill:blue!important}</style><rect id="x" style="fill:lime"/>')).toBe('blue');
  });

  test('specificity before order, order among equals', () => {
    expect(fillOfX('<style>#x{fill:a}.c{fill:b}rect{fill:c}</style><rect class="c" id="x"/>')).toBe('a');
    expect(fillOfX('<style>.c{fill:a}.d{fill:b}</style><rect class="d c" id="x"/>')).toBe('b');
    expect(fillOfX('<style>.c.d{fill:a}.d{fill:b}</style><rect class="c d" id="x"/>')).toBe('a');
  });

  test.each([
    ['*', true],
    ['rect', true],
    ['circle', false],
    ['.c', true],
    ['.d', false],
    ['g rect', true],
    ['g > rect', true],
    ['svg > rect', false],
    ['svg rect', true],
    ['path + rect', true],
    ['line + rect', false],
    ['line ~ rect', true],
    ['rect[width]', true],
    ['rect[width="5"]', true],
    ['rect[width="6"]', false],
    ['[class^="c"]', true],
    ['[class$="e"]', true],
    ['[class*="x"]', false],
    ['[class~="e"]', true],
    ['rect:nth-child(3)', true],
    ['rect:nth-child(2n+1)', true],
    ['rect:nth-child(even)', false],
    ['rect:last-child', true],
    ['rect:first-child', false],
    ['rect:not(.d)', true],
    ['rect:not(.c)', false],
    [':is(circle, rect)', true],
    [':root rect', true],
    ['rect:hover', false],
    ['circle, rect', true],
    ['rect::before', false],
  ])('%s selects: %s', (selector, selects) => {
    const inner = `<style>${selector}{fill:lime}</style><g><line/><path/><rect id="x" class="c e" width="5"/></g>`;
    expect(fillOfX(inner)).toBe(selects ? 'lime' : undefined);
  });

  test('rules for every medium and the screen count, those for print do not', () => {
    expect(fillOfX('<style>@media screen{rect{fill:lime}}</style><rect id="x"/>')).toBe('lime');
    expect(fillOfX('<style>@media print{rect{fill:lime}}</style><rect id="x"/>')).toBe(undefined);
    expect(fillOfX('<style><![CDATA[rect{fill:lime}]]></style><rect id="x"/>')).toBe('lime');
  });

  test('broken style sheets do no harm', () => {
    expect(fillOfX('<style>{{{ ] rect{fill:lime} }</style><rect id="x" fill="red"/>')).toMatch(/red|lime/);
    expect(fillOfX('<style></style><rect id="x" fill="red" style=";;:;fill"/>')).toBe('red');
  });
});
