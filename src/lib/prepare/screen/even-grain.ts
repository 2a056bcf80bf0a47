import type { Ranks } from './threshold-matrix';

const SIGMA = 1.5;
const FIRST_SHARE = 0.1;

/** A fixed sequence of numbers 0–1 (a 32-bit linear congruential generator, Numerical Recipes' constants). */
function fixedSequence(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
}

/** Dots on a square that meets itself at its edges, with how crowded each place is: a Gaussian around every dot. */
class Crowd {
  readonly dots: Uint8Array;
  private readonly crowding: Float64Array;
  private readonly bell: Float64Array;
  private readonly reach: number;

  constructor(private readonly size: number) {
    this.dots = new Uint8Array(size * size);
    this.crowding = new Float64Array(size * size);
    this.reach = Math.min(Math.ceil(6 * SIGMA), Math.floor((size - 1) / 2));
    this.bell = Float64Array.from({ length: this.reach + 1 }, (_, d) =>
      Math.exp((-d * d) / (2 * SIGMA * SIGMA)),
    );
  }

  set(place: number, dot: 0 | 1): void {
    const { size, reach, bell, crowding } = this;
    this.dots[place] = dot;
    const sign = dot === 1 ? 1 : -1;
    const [row, column] = [Math.floor(place / size), place % size];
    for (let dy = -reach; dy <= reach; dy++) {
      const line = ((row + dy + size) % size) * size;
      const share = sign * bell[Math.abs(dy)];
      for (let dx = -reach; dx <= reach; dx++)
        crowding[line + ((column + dx + size) % size)] += share * bell[Math.abs(dx)];
    }
  }

  /** The most crowded dot. */
  tightest(): number {
    let found = -1;
    for (let i = 0, most = -Infinity; i < this.dots.length; i++) {
      if (this.dots[i] === 1 && this.crowding[i] > most) most = this.crowding[(found = i)];
    }
    return found;
  }

  /** The emptiest place without a dot. */
  emptiest(): number {
    let found = -1;
    for (let i = 0, least = Infinity; i < this.dots.length; i++) {
      if (this.dots[i] === 0 && this.crowding[i] < least) least = this.crowding[(found = i)];
    }
    return found;
  }
}

/** A first tenth of dots, moved one by one from the tightest cluster into the largest void until that changes nothing. */
function spreadFirst(size: number): Crowd {
  const crowd = new Crowd(size);
  const next = fixedSequence(size);
  const wanted = Math.max(1, Math.round(size * size * FIRST_SHARE));
  for (let placed = 0; placed < wanted;) {
    const place = Math.floor(next() * size * size);
    if (crowd.dots[place] === 1) continue;
    crowd.set(place, 1);
    placed++;
  }
  for (;;) {
    const from = crowd.tightest();
    crowd.set(from, 0);
    const to = crowd.emptiest();
    crowd.set(to, 1);
    if (from === to) return crowd;
  }
}

function makeRanks(size: number): Ranks {
  const ranks = new Uint16Array(size * size);
  const first = spreadFirst(size);
  const kept = first.dots.slice();
  const count = kept.reduce((sum, dot) => sum + dot, 0);
  for (let rank = count - 1; rank >= 0; rank--) {
    const place = first.tightest();
    first.set(place, 0);
    ranks[place] = rank;
  }
  const crowd = new Crowd(size);
  kept.forEach((dot, place) => dot === 1 && crowd.set(place, 1));
  for (let rank = count; rank < size * size; rank++) {
    const place = crowd.emptiest();
    crowd.set(place, 1);
    ranks[place] = rank;
  }
  return { size, ranks };
}

const made = new Map<number, Ranks>();

/**
 * A square of ranks whose dots stand evenly apart at every tone, without a direction: void and cluster.
 * A tenth of the places is spread until the tightest cluster lies in the largest void; ranks are then taken away from the
 * tightest dots and given to the emptiest places, on a square that meets itself at its edges, Gaussian σ = 1.5. Past one
 * half the emptiest place without a dot is also the tightest cluster of places, so one rule serves both phases. The
 * beginning is a fixed sequence: the same square every time. Worked out once.
 * @param size side, 8 to 128
 * @returns each rank once; callers must not change it
 * @throws RangeError when size is not a whole number from 8 to 128
 * @see Ulichney, The void-and-cluster method for dither array generation, SPIE 1913, 1993, 332–343
 */
export function evenGrainRanks(size: number): Ranks {
  if (!Number.isInteger(size) || size < 8 || size > 128)
    throw new RangeError(`expected a side from 8 to 128, got ${size}`);
  const known = made.get(size) ?? makeRanks(size);
  made.set(size, known);
  return known;
}
