import type { ListedSheet } from '#shared/api/sheets';

/** The columns that order the list; `falling` tells which way each goes first. */
export const SHEET_COLUMNS = [
  { key: 'name', label: 'name', falling: false },
  { key: 'fets', label: 'FETs', falling: true },
  { key: 'worst', label: 'worst device', falling: false },
  { key: 'margin', label: 'margin / mV', falling: false },
  { key: 'here', label: 'here now', falling: true },
  { key: 'changed', label: 'last change', falling: true },
] as const;
export type SheetColumn = (typeof SHEET_COLUMNS)[number]['key'];

export type SheetOrder = { readonly by: SheetColumn; readonly falling: boolean };
export const LAST_CHANGED_FIRST: SheetOrder = { by: 'changed', falling: true };

const collator = new Intl.Collator('en', { numeric: true, sensitivity: 'base' });

/** The sheets in this order; equal ones by name. What has no figure in a column comes last either way. */
export function inOrder(sheets: readonly ListedSheet[], { by, falling }: SheetOrder): ListedSheet[] {
  return sheets.toSorted((a, b) => {
    const [left, right] = [rankOf(a, by), rankOf(b, by)];
    if (left === undefined || right === undefined) {
      if (left !== right) return left === undefined ? 1 : -1;
    } else if (left !== right) {
      const rising = typeof left === 'string' ? collator.compare(left, String(right)) : left - Number(right);
      if (rising !== 0) return falling ? -rising : rising;
    }
    return collator.compare(a.name, b.name) || (a.id < b.id ? -1 : 1);
  });
}

function rankOf(sheet: ListedSheet, by: SheetColumn): string | number | undefined {
  const { name, standing, here, changedAt } = sheet;
  const worst = standing?.status === 'solved' ? standing.worst : null;
  switch (by) {
    case 'name':
      return name;
    case 'fets':
      return standing?.fets;
    case 'worst':
      // A sheet without an answer wants looking at before any that has one; a missed region before any slack.
      if (standing?.status === 'unsolved' || standing?.status === 'invalid') return Number.MIN_SAFE_INTEGER;
      return worst ? worst.slack - (worst.verdict === 'missed' ? 1e9 : 0) : undefined;
    case 'margin':
      return worstMargin(sheet);
    case 'here':
      return here.length;
    case 'changed':
      return Date.parse(changedAt);
  }
}

/** The margin of the device of least slack, in volts. */
export function worstMargin({ standing }: ListedSheet): number | undefined {
  return standing?.status === 'solved' ? standing.worst?.margin : undefined;
}

/** Whether a sheet answers to what was typed: every word in its name, its author's or its state's. */
export function answersTo(sheet: ListedSheet, sought: string): boolean {
  const text = `${sheet.name} ${sheet.createdBy} ${sheet.state}`.toLocaleLowerCase('en');
  return sought
    .toLocaleLowerCase('en')
    .split(/\s+/)
    .every((word) => text.includes(word));
}
