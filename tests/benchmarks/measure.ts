/** Times a piece of work in rounds and returns the best microseconds a call: the machine's other work only ever adds. */
export function microseconds(work: () => unknown, { rounds = 15, millisecondsEach = 30 } = {}): number {
  const end = performance.now() + 100;
  let calls = 0;
  while (performance.now() < end) { work(); calls++; }
  const each = Math.max(1, Math.round(calls * millisecondsEach / 100));
  let best = Infinity;
  for (let round = 0; round < rounds; round++) {
    const start = performance.now();
    for (let i = 0; i < each; i++) work();
    best = Math.min(best, (performance.now() - start) * 1000 / each);
  }
  return best;
}

export interface Row { readonly what: string; readonly us: number; readonly aim?: number; readonly against?: string; readonly ratio?: number }

const figure = (us: number): string => us >= 1e6 ? `${(us / 1e6).toFixed(2)} s` : us >= 1000 ? `${(us / 1000).toFixed(us >= 1e4 ? 0 : 1)} ms` : `${us.toFixed(us < 10 ? 2 : 0)} µs`;

/** A table with ratios; says of each aim whether it was met. Returns whether all were. */
export function report(title: string, rows: readonly Row[]): boolean {
  console.log(`\n${title}`);
  const width = Math.max(...rows.map(({ what }) => what.length));
  for (const { what, us, aim, against, ratio } of rows)
    console.log(`  ${what.padEnd(width)}  ${figure(us).padStart(9)}${aim === undefined ? "" : `  aim ${figure(aim)} ${us <= aim ? "met" : "MISSED"}`}${ratio === undefined ? "" : `  ${ratio >= 1 ? `${ratio.toFixed(1)} times as fast as` : `${(1 / ratio).toFixed(1)} times as slow as`} ${against}`}`);
  return rows.every(({ us, aim }) => aim === undefined || us <= aim);
}
