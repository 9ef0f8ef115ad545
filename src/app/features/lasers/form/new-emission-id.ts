/** The first of e1, e2, e3 … that no line of this laser has. */
export function newEmissionId(taken: readonly string[]): string {
  for (let count = taken.length + 1; ; count += 1) {
    const id = `e${count}`;
    if (!taken.includes(id)) return id;
  }
}
