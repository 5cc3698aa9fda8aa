/** First letters of a name's first and last word: `Ines Rautio` gives `IR`, `Bo` gives `B`. */
export function initialsOf(name: string): string {
  const words = name.split(/\s+/u).filter((word) => word !== '');
  const chosen = words.length > 1 ? [words[0], words.at(-1)] : words;
  return chosen
    .map((word) => [...(word ?? '')][0] ?? '')
    .join('')
    .toLocaleUpperCase('en');
}
