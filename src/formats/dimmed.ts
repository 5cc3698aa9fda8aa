/**
 * Figures of an earlier circuit are dimmed, but only where the answer takes long enough to be waited for: it comes within a
 * few frames, and sixty tags that flicker at each keystroke would hide which of them changed.
 */
export function dimmed(outdated: boolean): string {
  return outdated ? 'opacity-45 transition-opacity delay-150' : 'transition-opacity';
}
