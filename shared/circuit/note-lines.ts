/** Most characters of one line of a note as it is drawn. */
const LINE_LENGTH = 48;

/** A note as it is drawn: its own lines, each broken between words where it is longer than the sheet has room for. */
export function noteLines(text: string): string[] {
  return text.split('\n').flatMap(broken);
}

function broken(line: string): string[] {
  const lines: string[] = [];
  let rest = line.trimEnd();
  while (rest.length > LINE_LENGTH) {
    const gap = rest.lastIndexOf(' ', LINE_LENGTH);
    const end = gap > 0 ? gap : LINE_LENGTH;
    lines.push(rest.slice(0, end).trimEnd());
    rest = rest.slice(end).trimStart();
  }
  return [...lines, rest];
}
