import { ArtworkError, LIMITS } from '../tools';

const tooLarge = (): ArtworkError =>
  new ArtworkError(
    'too-large',
    `This drawing is larger than ${LIMITS.maxSvgBytes / 1024 / 1024} MB once unpacked. ` +
      'Simplify its paths or take out embedded pictures, or export it as a PNG at the size you want.',
  );

async function inflate(bytes: Uint8Array): Promise<Uint8Array> {
  const source = new Blob([bytes as Uint8Array<ArrayBuffer>]).stream();
  const reader = source.pipeThrough(new DecompressionStream('gzip')).getReader();
  const parts: Uint8Array[] = [];
  let total = 0;
  try {
    for (;;) {
      const { done, value } = await reader.read();
      if (done) break;
      total += value.length;
      if (total > LIMITS.maxSvgBytes) throw tooLarge();
      parts.push(value);
    }
  } catch (cause) {
    await reader.cancel().catch(() => undefined);
    if (cause instanceof ArtworkError) throw cause;
    const message = 'This compressed SVG is damaged or cut off. Save it again and send the whole file.';
    throw new ArtworkError('truncated', message, { cause });
  }
  const whole = new Uint8Array(total);
  let at = 0;
  for (const part of parts) {
    whole.set(part, at);
    at += part.length;
  }
  return whole;
}

/** Encoding by the byte order mark, else by the XML declaration, else UTF-8 (XML 1.0, appendix F). */
function encodingOf(bytes: Uint8Array): string {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return 'utf-16le';
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return 'utf-16be';
  if (bytes[0] === 0x3c && bytes[1] === 0) return 'utf-16le';
  if (bytes[0] === 0 && bytes[1] === 0x3c) return 'utf-16be';
  const head = new TextDecoder('latin1').decode(bytes.subarray(0, 200));
  return /^\s*<\?xml[^>]*?encoding\s*=\s*["']([\w.:-]+)["']/.exec(head)?.[1] ?? 'utf-8';
}

/**
 * Text of an SVG file, unpacked when it is gzip (.svgz) and decoded by its own statement.
 * @param bytes the file; unchanged
 * @throws ArtworkError too-large beyond `LIMITS.maxSvgBytes` unpacked, truncated when the packing is damaged, unreadable
 * when the bytes are not text in the stated encoding
 */
export async function readText(bytes: Uint8Array): Promise<string> {
  const packed = bytes[0] === 0x1f && bytes[1] === 0x8b;
  if (!packed && bytes.length > LIMITS.maxSvgBytes) throw tooLarge();
  const plain = packed ? await inflate(bytes) : bytes;
  try {
    return new TextDecoder(encodingOf(plain), { fatal: true }).decode(plain);
  } catch (cause) {
    const message =
      'This SVG is not in the character encoding that it states. Save it as UTF-8 and send it again.';
    throw new ArtworkError('unreadable', message, { cause });
  }
}
