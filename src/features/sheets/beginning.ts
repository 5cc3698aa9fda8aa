import { STARTER_TITLES } from '#shared/starters/starter-titles';

/** What a new sheet begins from. */
export type Beginning =
  | { readonly kind: 'blank' }
  | { readonly kind: 'starter'; readonly id: string; readonly name: string; readonly about: string }
  | { readonly kind: 'file' };

export const BEGINNINGS: readonly Beginning[] = [
  { kind: 'blank' },
  ...STARTER_TITLES.map(({ id, name, about }) => ({ kind: 'starter', id, name, about }) as const),
  { kind: 'file' },
];

export function keyOf(beginning: Beginning): string {
  return beginning.kind === 'starter' ? beginning.id : beginning.kind;
}

export function nameOf(beginning: Beginning): string {
  switch (beginning.kind) {
    case 'blank':
      return 'Blank sheet';
    case 'starter':
      return beginning.name;
    case 'file':
      return 'Circuit file';
  }
}

export function aboutOf(beginning: Beginning): string {
  switch (beginning.kind) {
    case 'blank':
      return 'Nothing drawn yet.';
    case 'starter':
      return beginning.about;
    case 'file':
      return 'A .json file that Stillpoint or a script of yours wrote.';
  }
}
