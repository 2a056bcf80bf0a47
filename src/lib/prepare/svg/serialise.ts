import type { SvgNode } from './parse-xml';
import type { Page } from './physical-size';
import type { Style } from './resolve-styles';
import { rootTag } from './window-svg';

const escapeText = (text: string): string =>
  text.replace(/&/g, '&amp;').replace(/</g, '&lt;').replace(/>/g, '&gt;');
const escapeValue = (value: string): string =>
  escapeText(value)
    .replace(/"/g, '&quot;')
    .replace(/[\n\r\t]/g, ' ');

function startTag(node: SvgNode, style: Style): string {
  const declared = Object.entries(style).map(([name, value]) => `${name}:${value}`);
  const attributes = { ...node.attributes };
  if (declared.length > 0) attributes.style = declared.join(';');
  const written = Object.entries(attributes).map(([name, value]) => {
    // Older readers know references by this name only.
    return ` ${name === 'href' ? 'xlink:href' : name}="${escapeValue(value)}"`;
  });
  return `<${node.name}${written.join('')}`;
}

function write(node: SvgNode, styles: ReadonlyMap<SvgNode, Style>, parts: string[]): void {
  parts.push(startTag(node, styles.get(node) ?? {}));
  if (node.children.length === 0) {
    parts.push('/>');
    return;
  }
  parts.push('>');
  for (const child of node.children) {
    if (typeof child === 'string') parts.push(escapeText(child));
    else write(child, styles, parts);
  }
  parts.push(`</${node.name}>`);
}

/**
 * Text of a drawing that was sanitised, written and parsed before, with its root as it stands.
 * @param root outer root as `serialise` wrote it; unchanged
 * @param styles properties of its elements, which take the place of their style attributes
 */
export function serialiseTree(root: SvgNode, styles: ReadonlyMap<SvgNode, Style>): string {
  const { width, height, viewBox } = root.attributes;
  const parts = [rootTag(Number(width), Number(height), viewBox.split(' ').map(Number))];
  for (const child of root.children) if (typeof child !== 'string') write(child, styles, parts);
  parts.push('</svg>');
  return parts.join('');
}

/**
 * Text of a sanitised drawing: an outer root that frames the page in the drawing's own units, and the drawing within it,
 * so that a part can be shown by changing the outer tag alone and percentages keep their meaning.
 * @param root sanitised drawing; unchanged
 * @param styles properties of its elements
 * @param page what the root's size and viewBox came to
 */
export function serialise(root: SvgNode, styles: Map<SvgNode, Style>, page: Page): string {
  const [left, top, width, height] = page.viewBox;
  const inner: SvgNode = {
    name: 'svg',
    attributes: {
      ...root.attributes,
      x: `${left}`,
      y: `${top}`,
      width: `${width}`,
      height: `${height}`,
      viewBox: `${left} ${top} ${width} ${height}`,
      preserveAspectRatio: 'none',
    },
    children: root.children,
  };
  const style = { ...styles.get(root), overflow: 'visible' };
  const parts = [rootTag(page.widthPx, page.heightPx, page.frame)];
  write(inner, new Map(styles).set(inner, style), parts);
  parts.push('</svg>');
  return parts.join('');
}
