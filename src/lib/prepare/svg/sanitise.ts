import type { SvgNode } from './parse-xml';
import type { RemovedKind } from './removed';
import { resolveStyles, type Style } from './resolve-styles';
import { ATTRIBUTES, ELEMENTS, isGeometry, isProperty, SILENT } from './vocabulary';

/** A drawing that holds nothing but shapes, text, pictures of its own and references within itself. */
export interface Sanitised {
  root: SvgNode;
  /** properties of each element of `root`, geometry left out; property → value */
  styles: Map<SvgNode, Style>;
  removed: Set<RemovedKind>;
}

const ANIMATION = /^(animate\w*|set|discard|mpath)$/;
const PICTURE = /^data:image\/(png|jpe?g)\s*;\s*base64\s*,/i;
const REFERENCE = /url\(\s*(['"]?)([^)'"]*)\1\s*\)/gi;

function refusedElement(name: string): RemovedKind | null {
  if (name === 'script') return 'script';
  if (name === 'foreignObject') return 'foreign-object';
  if (ANIMATION.test(name)) return 'animation';
  if (name === 'feImage' || name === 'tref' || name === 'iframe') return 'remote-reference';
  if (/^(font|font-face|glyph|missing-glyph|altGlyph.*|font-face-.*)$/.test(name)) return 'embedded-font';
  return SILENT.has(name) ? null : 'unknown';
}

/** Whether every reference in a value stays within the drawing. */
function staysInside(value: string): boolean {
  // Escapes and comments can hide an address from a plain search; no drawing needs them here.
  if (/\\|\/\*|\bsrc\s*\(|image-set|@import|expression\s*\(/i.test(value)) return false;
  const rest = value.replace(REFERENCE, (_, _quote, target: string) =>
    target.trim().startsWith('#') ? '' : '!url(',
  );
  return !/url\s*\(/i.test(rest);
}

class Sanitiser {
  readonly removed = new Set<RemovedKind>();
  readonly styles = new Map<SvgNode, Style>();

  constructor(private readonly resolved: Map<SvgNode, Style>) {}

  element(node: SvgNode): SvgNode | null {
    if (!ELEMENTS.has(node.name)) {
      const kind = refusedElement(node.name);
      if (kind) this.removed.add(kind);
      return null;
    }
    const style = this.resolved.get(node) ?? {};
    // A link is a group to us.
    const name = node.name === 'a' ? 'g' : node.name;
    const attributes = this.attributes(node, style);
    if (name === 'image' && !attributes.href) return null;
    const clean: SvgNode = { name, attributes, children: [] };
    this.styles.set(clean, this.properties(style));
    const isText = /^(text|tspan|textPath)$/.test(name);
    for (const child of node.children) {
      const kept = typeof child === 'string' ? (isText ? child : null) : this.element(child);
      if (kept !== null) clean.children.push(kept);
    }
    return clean;
  }

  private attributes(node: SvgNode, style: Style): Record<string, string> {
    const clean: Record<string, string> = {};
    for (const [name, value] of Object.entries(node.attributes)) {
      if (/^on/i.test(name)) this.removed.add('handler');
      else if (name === 'href') this.reference(node, value, clean);
      else if (ATTRIBUTES.has(name) && this.isInside(value)) clean[name] = value;
    }
    for (const [name, value] of Object.entries(style)) {
      const own = node.attributes[name];
      if (!isGeometry(name) || value === own?.trim() || value === 'auto' || !this.isInside(value)) continue;
      clean[name] = name === 'transform' ? value.replace(/(px|deg)\b/g, '') : value;
    }
    return clean;
  }

  private reference(node: SvgNode, value: string, clean: Record<string, string>): void {
    const target = value.trim();
    if (node.name === 'a') return;
    if (node.name === 'image' && PICTURE.test(target)) clean.href = target;
    else if (node.name === 'image' && /^data:/i.test(target)) this.removed.add('embedded-picture');
    else if (node.name !== 'image' && target.startsWith('#')) clean.href = target;
    else this.removed.add('remote-reference');
  }

  private properties(style: Style): Style {
    const clean: Style = {};
    for (const [name, value] of Object.entries(style)) {
      if (isProperty(name) && !isGeometry(name) && this.isInside(value)) clean[name] = value;
    }
    return clean;
  }

  private isInside(value: string): boolean {
    const inside = staysInside(value);
    if (!inside) this.removed.add('remote-reference');
    return inside;
  }
}

/**
 * A new drawing built from what an allow-list lets through: no script, handler, animation, web content, style sheet or
 * reference that leaves the document; style sheets are resolved onto the elements.
 * @param root of the parsed drawing; unchanged
 * @throws ArtworkError too-complex when its style rules are too many
 */
export function sanitise(root: SvgNode): Sanitised {
  const resolved = resolveStyles(root);
  const sanitiser = new Sanitiser(resolved.styles);
  const clean = sanitiser.element(root) ?? { name: 'svg', attributes: {}, children: [] };
  if (resolved.importsDropped > 0) sanitiser.removed.add('import');
  if (resolved.fontFacesDropped > 0) sanitiser.removed.add('embedded-font');
  return { root: clean, styles: sanitiser.styles, removed: sanitiser.removed };
}
