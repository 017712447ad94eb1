/** Draws from one seed, so that a demo tells the same story whenever it is told. */
export interface Random {
  /** Uniform in [0, 1). */
  next(): number;
  /** Standard normal. */
  normal(): number;
  /** Triangular on short–typical–long, the plan's three points. */
  threePoint(short: number, typical: number, long: number): number;
}

/** FNV-1a, 32 bits: turns a name into a seed. Constants: Fowler, Noll and Vo's published parameters. */
function seedOf(name: string): number {
  let hash = 0x811c9dc5;
  for (const character of name) {
    hash ^= character.codePointAt(0) ?? 0;
    hash = Math.imul(hash, 0x01000193);
  }
  return hash >>> 0;
}

/** A small generator (mulberry32, 32 bits of state) seeded by a name such as `2026-03-03|OSQ|1742`. */
export function randomOf(name: string): Random {
  let state = seedOf(name);
  const next = (): number => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
  return {
    next,
    // Box and Muller's transform; 1 − u keeps the logarithm finite.
    normal: () => Math.sqrt(-2 * Math.log(1 - next())) * Math.cos(2 * Math.PI * next()),
    threePoint: (short, typical, long) => {
      if (long <= short) return typical;
      const draw = next();
      const turningPoint = (typical - short) / (long - short);
      return draw < turningPoint
        ? short + Math.sqrt(draw * (long - short) * (typical - short))
        : long - Math.sqrt((1 - draw) * (long - short) * (long - typical));
    },
  };
}
