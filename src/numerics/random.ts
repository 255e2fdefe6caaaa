/** Seeded random numbers: the same seed gives the same draws on every machine. */
export interface Random {
  /** in (0, 1), never an end */
  uniform(): number;
  /** standard normal */
  normal(): number;
}

/** Generator "sfc32" (small fast counting) of 128 bits of state by Chris Doty-Humphrey, public domain; normals by Box and Muller. */
export function seeded(seed: number): Random {
  let a = 0x9e3779b9 | 0, b = 0x243f6a88 | 0, c = seed | 0, counter = 1;
  const next = (): number => {
    const t = (a + b + counter) | 0;
    counter = (counter + 1) | 0;
    a = b ^ (b >>> 9);
    b = (c + (c << 3)) | 0;
    c = ((c << 21) | (c >>> 11)) + t | 0;
    return t >>> 0;
  };
  for (let i = 0; i < 15; i++) next();
  const uniform = (): number => (next() + 0.5) / 4294967296;
  let spare: number | null = null;
  return {
    uniform,
    normal() {
      if (spare !== null) {
        const kept = spare;
        spare = null;
        return kept;
      }
      const radius = Math.sqrt(-2 * Math.log(uniform())), angle = 2 * Math.PI * uniform();
      spare = radius * Math.sin(angle);
      return radius * Math.cos(angle);
    },
  };
}
