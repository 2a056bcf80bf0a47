/** What the outbox shows of a mail. */
export interface ReadMail {
  messageId: string;
  subject: string;
  text: string;
  html: string;
}

interface Part {
  headers: Map<string, string>;
  body: string;
}

function split(source: string): Part {
  const end = source.search(/\r?\n\r?\n/);
  const head = end === -1 ? source : source.slice(0, end);
  const headers = new Map<string, string>();
  for (const line of head.replace(/\r?\n[ \t]+/g, ' ').split(/\r?\n/)) {
    const colon = line.indexOf(':');
    if (colon > 0) headers.set(line.slice(0, colon).toLowerCase(), line.slice(colon + 1).trim());
  }
  return { headers, body: end === -1 ? '' : source.slice(end).replace(/^\r?\n\r?\n/, '') };
}

const quotedPrintable = (words: string): Buffer =>
  Buffer.from(
    words
      .replace(/=\r?\n/g, '')
      .replace(/=([0-9A-F]{2})/gi, (_, hex: string) => String.fromCharCode(parseInt(hex, 16))),
    'latin1',
  );

function content({ headers, body }: Part): string {
  const encoding = (headers.get('content-transfer-encoding') ?? '7bit').toLowerCase();
  if (encoding === 'base64') return Buffer.from(body, 'base64').toString('utf8');
  if (encoding === 'quoted-printable') return quotedPrintable(body).toString('utf8');
  return Buffer.from(body, 'latin1').toString('utf8');
}

/** A header with its encoded words (RFC 2047) read; bytes of neighbouring words are joined before they become letters. */
function header(words: string): string {
  return words.replace(/=\?utf-8\?[qb]\?[^?]*\?=(?:\s+=\?utf-8\?[qb]\?[^?]*\?=)*/gi, (run) => {
    const bytes = [...run.matchAll(/=\?utf-8\?([qb])\?([^?]*)\?=/gi)].map(([, kind, coded]) =>
      kind.toLowerCase() === 'b' ? Buffer.from(coded, 'base64') : quotedPrintable(coded.replaceAll('_', ' ')),
    );
    return Buffer.concat(bytes).toString('utf8');
  });
}

function leaves(part: Part): Part[] {
  const boundary = /boundary="?([^";]+)"?/i.exec(part.headers.get('content-type') ?? '')?.[1];
  if (!boundary) return [part];
  const pieces = `\n${part.body}`.split(
    new RegExp(`\\r?\\n--${boundary.replace(/[.*+?^${}()|[\]\\]/g, '\\$&')}(?:--)?[ \\t]*(?=\\r?\\n|$)`),
  );
  return pieces.slice(1, -1).flatMap((piece) => leaves(split(piece.replace(/^\r?\n/, ''))));
}

/** Reads a mail as our own sender writes it: text and HTML in UTF-8, alone or as alternatives (RFC 5322, 2045, 2047). */
export function readMime(source: Buffer): ReadMail {
  const whole = split(source.toString('latin1'));
  const parts = leaves(whole);
  const typed = (type: string): string => {
    const found = parts.find(({ headers }) =>
      (headers.get('content-type') ?? 'text/plain').toLowerCase().startsWith(type),
    );
    return found ? content(found).replaceAll('\r\n', '\n') : '';
  };
  return {
    messageId: whole.headers.get('message-id') ?? '',
    subject: header(whole.headers.get('subject') ?? ''),
    text: typed('text/plain'),
    html: typed('text/html'),
  };
}
