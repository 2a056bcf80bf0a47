import { ArtworkError, LIMITS } from '../tools';
import type { SvgNode } from './parse-xml';
import type { Style } from './resolve-styles';

/** Elements that are drawn once repeated parts are written out; more is a drawing made to multiply. */
const MAX_EXPANDED = 4 * LIMITS.maxSvgElements;
const MAX_CHAIN = 60;

const LOCAL = /url\(\s*['"]?#([^)'"\s]+)['"]?\s*\)/g;

const elementsOf = (node: SvgNode): SvgNode[] => node.children.filter((child) => typeof child !== 'string');

/** Ids that an element refers to: by href, and by its properties and attributes. */
function targetsOf(node: SvgNode, style: Style): string[] {
  const targets: string[] = [];
  if (node.attributes.href?.startsWith('#')) targets.push(node.attributes.href.slice(1));
  for (const value of [...Object.values(style), ...Object.values(node.attributes)]) {
    if (value.includes('url(')) for (const [, id] of value.matchAll(LOCAL)) targets.push(id);
  }
  return targets;
}

function index(root: SvgNode): Map<string, SvgNode> {
  const byId = new Map<string, SvgNode>();
  const visit = (node: SvgNode): void => {
    const { id } = node.attributes;
    if (id !== undefined && !byId.has(id)) byId.set(id, node);
    elementsOf(node).forEach(visit);
  };
  visit(root);
  return byId;
}

class Expansion {
  private counted = new Map<SvgNode, number>();
  private open = new Set<SvgNode>();
  private chain = 0;
  references = 0;

  constructor(
    private readonly byId: Map<string, SvgNode>,
    private readonly styles: Map<SvgNode, Style>,
  ) {}

  /** Elements drawn for one element, with everything that it refers to. */
  count(node: SvgNode): number {
    const known = this.counted.get(node);
    if (known !== undefined) return known;
    this.open.add(node);
    let total = 1;
    for (const child of elementsOf(node)) total += this.count(child);
    for (const id of targetsOf(node, this.styles.get(node) ?? {})) total += this.follow(id);
    if (total > MAX_EXPANDED) {
      const message =
        'This drawing repeats parts within repeated parts until there are too many to draw. ' +
        'Turn the repeated parts into plain shapes, or export it as a PNG at the size you want.';
      throw new ArtworkError('too-complex', message);
    }
    this.open.delete(node);
    this.counted.set(node, total);
    return total;
  }

  private follow(id: string): number {
    this.references += 1;
    if (this.references > LIMITS.maxSvgReferences) {
      const message =
        `This drawing has more than ${LIMITS.maxSvgReferences.toLocaleString('en-GB')} references between its parts. ` +
        'Turn symbols and repeated parts into plain shapes, or export it as a PNG at the size you want.';
      throw new ArtworkError('too-complex', message);
    }
    const target = this.byId.get(id);
    if (!target) return 0;
    if (this.open.has(target)) {
      const message =
        'This drawing contains a part that repeats itself without end. Remove the symbol that refers to itself and save it again.';
      throw new ArtworkError('too-complex', message);
    }
    this.chain += 1;
    if (this.chain > MAX_CHAIN) {
      throw new ArtworkError(
        'too-complex',
        'The parts of this drawing refer to each other in too long a chain. Simplify it.',
      );
    }
    const total = this.count(target);
    this.chain -= 1;
    return total;
  }
}

/**
 * Refuses drawings whose parts refer to themselves, multiply, or refer to each other without end.
 * @param root sanitised drawing; unchanged
 * @param styles properties of its elements
 * @returns elements that are drawn once everything is written out
 * @throws ArtworkError too-complex
 */
export function assertReferences(root: SvgNode, styles: Map<SvgNode, Style>): number {
  return new Expansion(index(root), styles).count(root);
}
