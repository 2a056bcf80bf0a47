import { parse, toPlainObject, type CssNodePlain, type SelectorPlain } from 'css-tree';
import { ArtworkError } from '../tools';
import { matchesSelector, specificity, type Standing } from './match-selector';
import type { SvgNode } from './parse-xml';
import { isProperty } from './vocabulary';

/** Properties of one element, after style sheets and its own style; property → value. */
export type Style = Record<string, string>;

export interface ResolvedStyles {
  styles: Map<SvgNode, Style>;
  importsDropped: number;
  fontFacesDropped: number;
}

interface Declaration {
  property: string;
  value: string;
  important: boolean;
}

interface Rule {
  selector: SelectorPlain;
  /** ids, classes, types and place in the document, most significant first */
  rank: readonly number[];
  declarations: Declaration[];
}

const MAX_RULES = 5_000;
/** Selectors are tried on elements at most so often; more is a drawing made to stall its reader. */
const MAX_TRIALS = 2_000_000;

function declarationsOf(nodes: readonly CssNodePlain[]): Declaration[] {
  return nodes.flatMap((node) => {
    if (node.type !== 'Declaration' || node.value.type !== 'Raw') return [];
    const property = node.property.toLowerCase();
    if (!isProperty(property)) return [];
    return [{ property, value: node.value.value.trim(), important: node.important !== false }];
  });
}

class Sheet {
  readonly rules: Rule[] = [];
  imports = 0;
  fontFaces = 0;

  add(text: string): void {
    const plain = toPlainObject(parse(text, { parseValue: false, onParseError: () => undefined }));
    if (plain.type === 'StyleSheet') this.take(plain.children);
  }

  private take(nodes: readonly CssNodePlain[]): void {
    for (const node of nodes) {
      if (node.type === 'Atrule') this.takeAtRule(node);
      else if (node.type === 'Rule' && node.prelude.type === 'SelectorList') {
        const declarations = declarationsOf(node.block.children);
        for (const selector of node.prelude.children) {
          if (selector.type !== 'Selector') continue;
          this.rules.push({ selector, rank: [...specificity(selector), this.rules.length], declarations });
        }
        if (this.rules.length > MAX_RULES) {
          throw new ArtworkError(
            'too-complex',
            `This drawing has more than ${MAX_RULES} style rules. Simplify it.`,
          );
        }
      }
    }
  }

  private takeAtRule(node: Extract<CssNodePlain, { type: 'Atrule' }>): void {
    const name = node.name.toLowerCase();
    if (name === 'import') this.imports += 1;
    else if (name === 'font-face') this.fontFaces += 1;
    else if (name === 'media' && node.block && isForEveryMedium(node.prelude)) this.take(node.block.children);
  }
}

function isForEveryMedium(prelude: CssNodePlain | null): boolean {
  return prelude === null || /"mediaType":"(all|screen)","condition":null/.test(JSON.stringify(prelude));
}

/** Last compound's id, class or type: the cheapest thing that an element must have. */
function keyOf(selector: SelectorPlain): string {
  let key = '*';
  for (let index = selector.children.length - 1; index >= 0; index -= 1) {
    const part = selector.children[index];
    if (part.type === 'Combinator') break;
    if (part.type === 'IdSelector') return `#${part.name}`;
    if (part.type === 'ClassSelector') key = `.${part.name}`;
    else if (part.type === 'TypeSelector' && key === '*' && part.name !== '*') key = part.name;
  }
  return key;
}

function styleText(root: SvgNode): string[] {
  const texts: string[] = [];
  const visit = (node: SvgNode): void => {
    if (node.name === 'style')
      texts.push(node.children.filter((child) => typeof child === 'string').join(''));
    for (const child of node.children) if (typeof child !== 'string') visit(child);
  };
  visit(root);
  return texts;
}

const compareRank = (a: readonly number[], b: readonly number[]): number => {
  const first = a.findIndex((value, index) => value !== b[index]);
  return first < 0 ? 0 : a[first] - b[first];
};

class Cascade {
  private byKey = new Map<string, Rule[]>();
  private trials = 0;

  constructor(rules: readonly Rule[]) {
    for (const rule of rules) {
      const key = keyOf(rule.selector);
      this.byKey.set(key, [...(this.byKey.get(key) ?? []), rule]);
    }
  }

  styleOf(at: Standing): Style {
    const { attributes } = at.node;
    const style: Style = {};
    for (const [name, value] of Object.entries(attributes)) if (isProperty(name)) style[name] = value.trim();
    const own = attributes.style
      ? parse(attributes.style, { context: 'declarationList', parseValue: false })
      : null;
    const plain = own ? toPlainObject(own) : null;
    const inline = plain?.type === 'DeclarationList' ? declarationsOf(plain.children) : [];
    const layers = [...this.matching(at).map((rule) => rule.declarations), inline];
    for (const important of [false, true]) {
      for (const layer of layers) {
        for (const item of layer) if (item.important === important) style[item.property] = item.value;
      }
    }
    return style;
  }

  private matching(at: Standing): Rule[] {
    const { id } = at.node.attributes;
    const keys = ['*', at.node.name, ...at.classes.map((name) => `.${name}`), ...(id ? [`#${id}`] : [])];
    const tried = [...new Set(keys)].flatMap((key) => this.byKey.get(key) ?? []);
    this.trials += tried.length;
    if (this.trials > MAX_TRIALS) {
      throw new ArtworkError(
        'too-complex',
        'This drawing has too many style rules for its size. Simplify it.',
      );
    }
    return tried
      .filter((rule) => matchesSelector(rule.selector, at))
      .sort((a, b) => compareRank(a.rank, b.rank));
  }
}

/**
 * Declared properties of every element: presentation attributes, then style sheets by importance, specificity and order,
 * then the element's own style. Inheritance is not applied.
 * Source: W3C, CSS Cascading and Inheritance Level 4, section 6; SVG 2, section 6.6.
 * @param root of the drawing; unchanged
 * @throws ArtworkError too-complex when there are more rules, or rules on elements, than a drawing needs
 */
export function resolveStyles(root: SvgNode): ResolvedStyles {
  const sheet = new Sheet();
  for (const text of styleText(root)) sheet.add(text);
  const cascade = new Cascade(sheet.rules);
  const styles = new Map<SvgNode, Style>();
  const visit = (at: Standing): void => {
    styles.set(at.node, cascade.styleOf(at));
    const elements = at.node.children.filter((child) => typeof child !== 'string');
    let previous: Standing | null = null;
    elements.forEach((node, index) => {
      const standing: Standing = standingOf(node, at, previous, index + 1, elements.length);
      visit(standing);
      previous = standing;
    });
  };
  visit(standingOf(root, null, null, 1, 1));
  return { styles, importsDropped: sheet.imports, fontFacesDropped: sheet.fontFaces };
}

function standingOf(
  node: SvgNode,
  parent: Standing | null,
  previous: Standing | null,
  place: number,
  siblings: number,
): Standing {
  const classes = (node.attributes.class ?? '').split(/\s+/).filter((name) => name !== '');
  return { node, parent, previous, place, siblings, classes };
}
