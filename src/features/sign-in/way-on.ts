/** Where to go after signing in: the page that asked for it, if it is one of ours, else the team's sheets. */
export function wayOn(search: URLSearchParams): string {
  const then = search.get('then') ?? '/';
  // A second slash (or a backslash, which browsers read as one) would lead to another site.
  return /^\/(?![/\\])/.test(then) ? then : '/';
}
