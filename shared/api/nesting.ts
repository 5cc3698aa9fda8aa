/** How deep data from outside may be nested; nothing of ours comes near it, and what recurses over it is safe. */
export const DEEPEST = 32;

/** Whether there are more levels of objects and lists in this than so many. */
export function isDeeperThan(levels: number, value: unknown): boolean {
  if (typeof value !== 'object' || value === null) return false;
  return levels === 0 || Object.values(value).some((inner) => isDeeperThan(levels - 1, inner));
}
