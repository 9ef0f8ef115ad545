const WARM_UP_MS = 400;
const MEASURED_MS = 400;
const ROUNDS = 3;
const CALLS_BETWEEN_CLOCKS = 256;

/** Keeps the results in use, so that no call is left out by the compiler. */
let sink = 0;

/** How often a function can be called in a second: the best of some rounds after a warm-up. */
export function callsPerSecond(call: (index: number) => number): number {
  measure(call, WARM_UP_MS);
  let best = 0;
  for (let round = 0; round < ROUNDS; round++) best = Math.max(best, measure(call, MEASURED_MS));
  if (Number.isNaN(sink)) throw new Error('The measured function gave no number.');
  return Math.round(best);
}

function measure(call: (index: number) => number, durationMs: number): number {
  const start = performance.now();
  let calls = 0;
  let elapsedMs = 0;
  while (elapsedMs < durationMs) {
    for (let i = 0; i < CALLS_BETWEEN_CLOCKS; i++) sink += call(calls + i);
    calls += CALLS_BETWEEN_CLOCKS;
    elapsedMs = performance.now() - start;
  }
  return (calls / elapsedMs) * 1000;
}
