import type { CssNodePlain, SelectorPlain } from 'css-tree';
import type { SvgNode } from './parse-xml';

/** Where an element stands: what selectors may ask for. */
export interface Standing {
  node: SvgNode;
  parent: Standing | null;
  /** element before it under the same parent */
  previous: Standing | null;
  /** place among the elements of its parent, from 1 */
  place: number;
  /** number of elements of its parent */
  siblings: number;
  classes: string[];
}

export type Specificity = readonly [number, number, number];

const ATTRIBUTE_TEST: Record<string, (own: string, asked: string) => boolean> = {
  '=': (own, asked) => own === asked,
  '~=': (own, asked) => own.split(/\s+/).includes(asked),
  '|=': (own, asked) => own === asked || own.startsWith(`${asked}-`),
  '^=': (own, asked) => asked !== '' && own.startsWith(asked),
  '$=': (own, asked) => asked !== '' && own.endsWith(asked),
  '*=': (own, asked) => asked !== '' && own.includes(asked),
};

function matchesNth(part: CssNodePlain, place: number): boolean {
  if (part.type !== 'Nth') return false;
  const { nth } = part;
  if (nth.type === 'Identifier') return nth.name === 'even' ? place % 2 === 0 : place % 2 === 1;
  if (nth.type !== 'AnPlusB') return false;
  const [step, offset] = [Number(nth.a ?? 0), Number(nth.b ?? 0)];
  return step === 0 ? place === offset : (place - offset) % step === 0 && (place - offset) / step >= 0;
}

function matchesPseudoClass(
  part: Extract<CssNodePlain, { type: 'PseudoClassSelector' }>,
  at: Standing,
): boolean {
  const lists = (part.children ?? []).filter((child) => child.type === 'SelectorList');
  const any = (): boolean =>
    lists.some((list) => list.children.some((item) => item.type === 'Selector' && matchesSelector(item, at)));
  switch (part.name) {
    case 'root':
      return at.parent === null;
    case 'first-child':
      return at.place === 1;
    case 'last-child':
      return at.place === at.siblings;
    case 'only-child':
      return at.siblings === 1;
    case 'nth-child':
      return (part.children ?? []).some((child) => matchesNth(child, at.place));
    case 'nth-last-child':
      return (part.children ?? []).some((child) => matchesNth(child, at.siblings + 1 - at.place));
    case 'not':
      return !any();
    case 'is':
    case 'where':
      return any();
    case 'link':
      return at.node.name === 'a';
    default:
      return false;
  }
}

function matchesPart(part: CssNodePlain, at: Standing): boolean {
  switch (part.type) {
    case 'TypeSelector':
      return part.name === '*' || part.name.replace(/^.*\|/, '') === at.node.name;
    case 'ClassSelector':
      return at.classes.includes(part.name);
    case 'IdSelector':
      return at.node.attributes.id === part.name;
    case 'AttributeSelector': {
      const own = at.node.attributes[part.name.name.replace(/^.*\|/, '')];
      if (own === undefined) return false;
      if (part.matcher === null || part.value === null) return true;
      const asked = part.value.type === 'String' ? part.value.value : part.value.name;
      return ATTRIBUTE_TEST[part.matcher]?.(own, asked) ?? false;
    }
    case 'PseudoClassSelector':
      return matchesPseudoClass(part, at);
    default:
      return false;
  }
}

function matchesFrom(parts: readonly CssNodePlain[], last: number, at: Standing): boolean {
  let index = last;
  for (; index >= 0; index -= 1) {
    const part = parts[index];
    if (part.type === 'Combinator') break;
    if (!matchesPart(part, at)) return false;
  }
  if (index < 0) return true;
  const { name } = parts[index] as Extract<CssNodePlain, { type: 'Combinator' }>;
  if (name === '>') return at.parent !== null && matchesFrom(parts, index - 1, at.parent);
  if (name === '+') return at.previous !== null && matchesFrom(parts, index - 1, at.previous);
  const onward = (from: Standing): Standing | null => (name === '~' ? from.previous : from.parent);
  for (let next = onward(at); next; next = onward(next)) if (matchesFrom(parts, index - 1, next)) return true;
  return false;
}

/**
 * Whether a selector selects an element; what it does not know it does not select.
 * Source: W3C, Selectors Level 4 (type, class, id, attribute, structural pseudo-classes, the four combinators).
 */
export function matchesSelector(selector: SelectorPlain, at: Standing): boolean {
  return matchesFrom(selector.children, selector.children.length - 1, at);
}

/** Specificity as (ids, classes, types); Selectors Level 4, section 17. */
export function specificity(selector: SelectorPlain): Specificity {
  const sum = [0, 0, 0];
  for (const part of selector.children) {
    if (part.type === 'IdSelector') sum[0] += 1;
    else if (part.type === 'ClassSelector' || part.type === 'AttributeSelector') sum[1] += 1;
    else if (part.type === 'TypeSelector') sum[2] += part.name === '*' ? 0 : 1;
    else if (part.type === 'PseudoClassSelector' && part.name !== 'where') {
      const lists = (part.children ?? []).filter((child) => child.type === 'SelectorList');
      const inner = lists.flatMap((list) => list.children).filter((item) => item.type === 'Selector');
      if (lists.length === 0) sum[1] += 1;
      else inner.map(specificity).forEach((own) => own.forEach((value, index) => (sum[index] += value)));
    }
  }
  return sum as unknown as Specificity;
}
