import type { SvgNode } from './parse-xml';
import type { Style } from './resolve-styles';

/** Families that text is drawn with as asked; `sans-serif` is what the shipped one is. */
const SHIPPED = new Set(['manrope', 'sans-serif', 'system-ui', 'ui-sans-serif', 'inherit', 'initial']);

/** First family of a list: the one that was wished for. */
function firstFamily(list: string): string {
  const first = /^\s*(?:"([^"]*)"|'([^']*)'|([^,]*))/.exec(list);
  return (first?.[1] ?? first?.[2] ?? first?.[3] ?? '').trim();
}

/** The family list within the `font` shorthand: what follows the size (CSS Fonts 4, section 2.7). */
function familyOfShorthand(font: string): string | null {
  return (
    /(?:^|\s)(?:[\d.]+(?:px|pt|em|mm|cm|in|pc|q|rem|ex|%)|(?:x{1,2}-)?(?:small|large)|medium|larger|smaller)(?:\s*\/\s*\S+)?\s+(.+)$/i.exec(
      font,
    )?.[1] ?? null
  );
}

/**
 * Font families that visible text asks for first and that are not shipped, in document order, each once.
 * @param root sanitised drawing; unchanged
 * @param styles properties of its elements
 */
export function missingFonts(root: SvgNode, styles: Map<SvgNode, Style>): string[] {
  const missing = new Map<string, string>();
  const visit = (node: SvgNode, inherited: string): void => {
    const style = styles.get(node) ?? {};
    if (style.display === 'none') return;
    const family = style['font-family'] ?? (style.font && familyOfShorthand(style.font)) ?? inherited;
    for (const child of node.children) {
      if (typeof child !== 'string') visit(child, family);
      else if (child.trim() !== '' && family !== '') {
        const wished = firstFamily(family);
        const key = wished.toLowerCase();
        if (wished !== '' && !SHIPPED.has(key) && !missing.has(key)) missing.set(key, wished);
      }
    }
  };
  visit(root, '');
  return [...missing.values()];
}
