/** Order of references as a parts list has it: by letters, then by number, so that Q2 comes before Q10. */
export function byReference(a: string, b: string): number {
  const [lettersA, numberA] = split(a);
  const [lettersB, numberB] = split(b);
  if (lettersA !== lettersB) return lettersA < lettersB ? -1 : 1;
  if (numberA !== numberB) return numberA - numberB;
  return a === b ? 0 : a < b ? -1 : 1;
}

function split(ref: string): [letters: string, number: number] {
  const match = /^([A-Za-z_]+)(\d+)$/.exec(ref);
  return match ? [match[1] ?? '', Number(match[2])] : [ref, -1];
}
