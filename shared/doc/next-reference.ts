/** The lowest free reference with these letters: Q1, Q2, … */
export function nextReference(taken: ReadonlySet<string>, letters: string): string {
  for (let n = 1; ; n++) {
    const ref = `${letters}${n}`;
    if (!taken.has(ref)) return ref;
  }
}
