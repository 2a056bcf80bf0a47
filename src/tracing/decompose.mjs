// SPDX-License-Identifier: GPL-2.0-only
// First stage of potrace on a picture packed into 32-bit words: the same paths in the same order as the package's own
// stage, found without a function call for each pixel. After Peter Selinger's potrace (decompose.c) and the JavaScript
// port in npm's potrace.
import { createRequire } from 'node:module';

const require = createRequire(import.meta.url);
const Path = require('potrace/lib/types/Path.js');
const Point = require('potrace/lib/types/Point.js');

/** Pixels one bit each, most significant bit first, with a margin of white on every side. */
class Bits {
  constructor(grey, width, height, threshold) {
    this.width = width;
    this.height = height;
    this.stride = (width + 2 + 31) >>> 5;
    this.words = new Uint32Array(this.stride * (height + 2));
    for (let row = 0, at = 0; row < height; row += 1) {
      const start = (row + 1) * this.stride;
      let word = 0;
      for (let x = 1; x <= width; x += 1, at += 1) {
        word = (word << 1) | (grey[at] <= threshold ? 1 : 0);
        if ((x & 31) === 31) {
          this.words[start + (x >>> 5)] = word;
          word = 0;
        }
      }
      if ((width & 31) !== 31) this.words[start + (width >>> 5)] = word << (31 - (width & 31));
    }
  }

  /** Pixel at a column and row counted from the picture's own corner; white outside. */
  at(column, row) {
    const x = column + 1;
    return (this.words[(row + 1) * this.stride + (x >>> 5)] >>> (31 - (x & 31))) & 1;
  }

  /** Turns over the pixels of a row from one column up to but not including another. */
  invert(row, from, to) {
    const start = (row + 1) * this.stride;
    const [a, b] = [from + 1, to + 1];
    const [first, last] = [a >>> 5, b >>> 5];
    const head = 0xffffffff >>> (a & 31);
    const tail = (b & 31) === 0 ? 0 : ~(0xffffffff >>> (b & 31));
    if (first === last) {
      this.words[start + first] ^= head & tail;
      return;
    }
    this.words[start + first] ^= head;
    for (let word = first + 1; word < last; word += 1) this.words[start + word] ^= 0xffffffff;
    if (tail !== 0) this.words[start + last] ^= tail;
  }
}

/** Colour that most of the neighbourhood of a corner has. */
function majority(bits, x, y) {
  const inside = (column, row) =>
    column >= 0 && row >= 0 && column < bits.width && row < bits.height && bits.at(column, row) === 1;
  for (let size = 2; size < 5; size += 1) {
    let sum = 0;
    for (let step = -size + 1; step <= size - 1; step += 1) {
      sum += inside(x + step, y + size - 1) ? 1 : -1;
      sum += inside(x + size - 1, y + step - 1) ? 1 : -1;
      sum += inside(x + step - 1, y - size) ? 1 : -1;
      sum += inside(x - size, y + step) ? 1 : -1;
    }
    if (sum !== 0) return sum > 0;
  }
  return false;
}

/** Border of the region whose first pixel is given, turning at doubtful corners so that the rarer colour stays joined. */
function follow(bits, column, row) {
  const path = new Path();
  let [x, y, dx, dy] = [column, row, 0, 1];
  for (;;) {
    path.pt.push(new Point(x, y));
    if (x > path.maxX) path.maxX = x;
    if (x < path.minX) path.minX = x;
    if (y > path.maxY) path.maxY = y;
    if (y < path.minY) path.minY = y;
    path.len += 1;
    x += dx;
    y += dy;
    path.area -= x * dy;
    if (x === column && y === row) return path;
    const left = bits.at(x + (dx + dy - 1) / 2, y + (dy - dx - 1) / 2);
    const right = bits.at(x + (dx - dy - 1) / 2, y + (dy + dx - 1) / 2);
    // Right and no left is the doubtful corner; both or neither leave one way.
    const turnRight = right === 1 && (left === 1 || !majority(bits, x, y));
    if (turnRight) [dx, dy] = [-dy, dx];
    else if (right === 1 || left === 0) [dx, dy] = [dy, -dx];
  }
}

/** Takes a path's inside out of the picture. */
function remove(bits, path) {
  let before = path.pt[0].y;
  for (let index = 1; index < path.len; index += 1) {
    const { x, y } = path.pt[index];
    if (y === before) continue;
    bits.invert(Math.min(before, y), x, path.maxX);
    before = y;
  }
}

/**
 * Paths around the dark regions of a luminance picture, those of up to `smallest` pixels left out. One at a time, so that
 * a page of text is never held as millions of points at once.
 */
export function* decompose(grey, width, height, threshold, smallest) {
  const bits = new Bits(grey, width, height, threshold);
  for (let row = 0; row < height; row += 1) {
    const start = (row + 1) * bits.stride;
    for (let word = 0; word < bits.stride;) {
      const value = bits.words[start + word];
      if (value === 0) {
        word += 1;
        continue;
      }
      const path = follow(bits, word * 32 + Math.clz32(value) - 1, row);
      // Holes are turned the other way by the next stage; the packed picture no longer knows them from islands.
      path.sign = grey[path.pt[0].y * width + path.pt[0].x] <= threshold ? '+' : '-';
      remove(bits, path);
      if (path.area > smallest) yield path;
    }
  }
}
