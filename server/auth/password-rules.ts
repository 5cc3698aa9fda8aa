import { PASSWORD_LENGTH } from '#shared/api/accounts';
import common from './common-passwords.json';

const COMMON = new Set(common.passwords.split(' '));

/**
 * Why this cannot be a new password, in words for its owner, or undefined. Beyond its length it must not be one of
 * the commonest, and must be long enough without the words of the owner's own name and address.
 */
export function passwordFault(password: string, owner: { name: string; email: string }): string | undefined {
  const text = password.normalize('NFKC').toLowerCase();
  if (length(text) < PASSWORD_LENGTH.least) return `At least ${PASSWORD_LENGTH.least} characters.`;
  if (length(text) > PASSWORD_LENGTH.most) return `At most ${PASSWORD_LENGTH.most} characters.`;
  if (COMMON.has(text)) return 'This is one of the commonest passwords: choose another.';
  const rest = ownWords(owner).reduce((left, word) => left.replaceAll(word, ''), text);
  if (length(rest) < PASSWORD_LENGTH.least) return 'This is little more than your own name or address: choose another.';
  return undefined;
}

function length(text: string): number {
  return [...text].length;
}

function ownWords({ name, email }: { name: string; email: string }): string[] {
  const words = `${name} ${email}`
    .normalize('NFKC')
    .toLowerCase()
    .split(/[^\p{L}\p{N}]+/u);
  // Longest first: "ann" must not break up "annika".
  return words.filter((word) => length(word) >= 3).sort((a, b) => b.length - a.length);
}
