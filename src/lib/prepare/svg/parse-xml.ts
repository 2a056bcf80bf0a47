import { SaxesParser, type SaxesTagPlain } from 'saxes';
import { ArtworkError, LIMITS } from '../tools';

/** One element of a parsed drawing; names are local names, `href` stands for `xlink:href` too. */
export interface SvgNode {
  name: string;
  attributes: Record<string, string>;
  children: (SvgNode | string)[];
}

export interface ParsedSvg {
  root: SvgNode;
  /** whether the document declares entities of its own */
  hasEntities: boolean;
}

const SVG_NS = 'http://www.w3.org/2000/svg';
const XLINK_NS = 'http://www.w3.org/1999/xlink';
/** Drawing programs keep their namespaces in short entities; these are let through, nothing that nests or loads. */
const PLAIN_ENTITY = /<!ENTITY\s+([\w.-]+)\s+(?:"([^"&<%]{0,200})"|'([^'&<%]{0,200})')\s*>/g;
const MAX_ENTITIES = 50;
const MAX_ATTRIBUTE_CHARS = LIMITS.maxSvgBytes;

const refuse = (what: string): ArtworkError =>
  new ArtworkError('too-complex', `${what} Simplify it, or export it as a PNG at the size you want.`);

const commas = (value: number): string => value.toLocaleString('en-GB');

/** Prefixes as the document declares them; which element declared them is not asked. */
class Names {
  private uris = new Map<string, string>([
    ['svg', SVG_NS],
    ['xlink', XLINK_NS],
  ]);

  learn(attributes: Record<string, string>): void {
    for (const [name, value] of Object.entries(attributes)) {
      if (name === 'xmlns') this.uris.set('', value);
      else if (name.startsWith('xmlns:')) this.uris.set(name.slice(6), value);
    }
  }

  /** Local name of an element of SVG, else null. */
  element(name: string, own: Record<string, string>): string | null {
    const colon = name.indexOf(':');
    if (colon < 0) return own.xmlns === undefined || own.xmlns === SVG_NS ? name : null;
    return this.uris.get(name.slice(0, colon)) === SVG_NS ? name.slice(colon + 1) : null;
  }

  attribute(name: string): string | null {
    const colon = name.indexOf(':');
    if (colon < 0) return name === 'xmlns' ? null : name;
    const [prefix, local] = [name.slice(0, colon), name.slice(colon + 1)];
    if (prefix === 'xml') return local === 'space' ? 'xml:space' : null;
    return this.uris.get(prefix) === XLINK_NS && local === 'href' ? 'href' : null;
  }
}

function plainEntities(doctype: string): Record<string, string> {
  const found: Record<string, string> = {};
  for (const [, name, double, single] of [...doctype.matchAll(PLAIN_ENTITY)].slice(0, MAX_ENTITIES)) {
    found[name] = double ?? single ?? '';
  }
  return found;
}

class Builder {
  root: SvgNode | null = null;
  hasEntities = false;
  private open: (SvgNode | null)[] = [];
  private names = new Names();
  private elements = 0;
  private chars = 0;

  start(tag: SaxesTagPlain): void {
    this.elements += 1;
    if (this.elements > LIMITS.maxSvgElements) {
      throw refuse(`This drawing has more than ${commas(LIMITS.maxSvgElements)} elements.`);
    }
    if (this.open.length >= LIMITS.maxSvgDepth) {
      throw refuse(`This drawing nests its groups more than ${LIMITS.maxSvgDepth} deep.`);
    }
    this.names.learn(tag.attributes);
    const name = this.names.element(tag.name, tag.attributes);
    const parent = this.open[this.open.length - 1];
    const node: SvgNode | null = name === null ? null : { name, attributes: {}, children: [] };
    // Foreign elements are stepped over with all that they hold.
    if (this.open.length > 0 && (parent === null || node === null)) {
      this.open.push(null);
      return;
    }
    if (node === null || (this.open.length === 0 && node.name !== 'svg')) {
      throw new ArtworkError(
        'unreadable',
        'This file is XML but not an SVG drawing. Save it as SVG and send it again.',
      );
    }
    for (const [key, value] of Object.entries(tag.attributes)) {
      const attribute = this.names.attribute(key);
      this.count(value.length);
      if (attribute !== null && !(attribute === 'href' && 'href' in node.attributes))
        node.attributes[attribute] = value;
    }
    if (parent) parent.children.push(node);
    else this.root ??= node;
    this.open.push(node);
  }

  end(): void {
    this.open.pop();
  }

  text(text: string): void {
    this.count(text.length);
    this.open[this.open.length - 1]?.children.push(text);
  }

  // Entities that repeat could still grow a small file: what counts is what comes out.
  private count(chars: number): void {
    this.chars += chars;
    if (this.chars > MAX_ATTRIBUTE_CHARS)
      throw refuse('This drawing grows beyond what we allow when it is read.');
  }
}

function xmlTrouble(error: Error): ArtworkError {
  if (/undefined entity|entity/i.test(error.message)) {
    const message =
      'This SVG builds its content from entities, which we do not expand. Save it as a plain SVG and send it again.';
    return new ArtworkError('unreadable', message, { cause: error });
  }
  if (/unclosed tag|unexpected end|document must contain a root/i.test(error.message)) {
    const message = 'This SVG stops before its end: it was cut off. Save it again and send the whole file.';
    return new ArtworkError('truncated', message, { cause: error });
  }
  const message =
    'This SVG is not well-formed, so it cannot be read. Open it in a drawing program and save it again.';
  return new ArtworkError('unreadable', message, { cause: error });
}

/**
 * Parses an SVG document into a tree of SVG elements and text, refusing what is too large, too deep or built of entities.
 * Elements of other namespaces are left out; nothing is loaded and no entity is expanded but short plain ones.
 * @param text the document
 * @throws ArtworkError too-complex beyond the limits, truncated where it stops early, unreadable otherwise
 */
export function parseXml(text: string): ParsedSvg {
  const builder = new Builder();
  const parser = new SaxesParser();
  parser.on('doctype', (doctype) => {
    builder.hasEntities = /<!ENTITY/.test(doctype);
    Object.assign(parser.ENTITIES, plainEntities(doctype));
  });
  parser.on('opentag', (tag) => builder.start(tag));
  parser.on('closetag', () => builder.end());
  parser.on('text', (part) => builder.text(part));
  parser.on('cdata', (part) => builder.text(part));
  parser.on('error', (error) => {
    throw xmlTrouble(error);
  });
  parser.write(text).close();
  if (!builder.root) throw xmlTrouble(new Error('document must contain a root element'));
  return { root: builder.root, hasEntities: builder.hasEntities };
}
