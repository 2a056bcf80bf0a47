/** Milliseconds per stage as a small table. */
export function timingsText(timings: Readonly<Record<string, number>>): string {
  return Object.entries(timings)
    .map(([stage, ms]) => `${stage.padEnd(24)}${ms.toFixed(0).padStart(8)} ms\n`)
    .join('');
}
