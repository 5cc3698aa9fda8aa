import { expect, test } from 'vitest';
import type { ListedSheet, SheetStanding } from '#shared/api/sheets';
import { answersTo, inOrder, SHEET_COLUMNS } from '../../../../src/features/sheets/sheet-order';

const sheet = (name: string, standing: SheetStanding | null, more: Partial<ListedSheet> = {}): ListedSheet => ({
  id: name,
  teamId: 'team',
  name,
  state: 'draft',
  archived: false,
  createdAt: '2026-03-01T08:00:00.000Z',
  changedAt: '2026-03-01T08:00:00.000Z',
  createdBy: 'Ines Rautio',
  standing,
  here: [],
  ...more,
});
const worst = (verdict: 'met' | 'thin' | 'missed', margin: number, slack: number): SheetStanding => ({
  status: 'solved',
  fets: 2,
  verdicts: { met: 0, thin: 0, missed: 0, [verdict]: 1 },
  worst: { ref: 'Q1', verdict, margin, slack },
});

const SHEETS = [
  sheet('Stage 10', worst('met', 0.4, 0.3)),
  sheet('stage 2', worst('thin', 0.05, -0.05)),
  // Off where it should be saturated: its margin is large all the same.
  sheet('Off', worst('missed', 0.6, 0.5)),
  sheet('Broken', { status: 'invalid', fets: 3, reason: 'Net in floats.' }),
  sheet('Pending', null),
  sheet('Blank', { status: 'empty', fets: 0 }),
];
const order = (by: (typeof SHEET_COLUMNS)[number]['key'], falling: boolean) =>
  inOrder(SHEETS, { by, falling }).map(({ name }) => name);

test('the worst come first: what cannot be solved, then a missed region, then the least slack', () => {
  expect(order('worst', false)).toEqual(['Broken', 'Off', 'stage 2', 'Stage 10', 'Blank', 'Pending']);
});

test('what has no figure comes last whichever way the others go', () => {
  expect(order('margin', false)).toEqual(['stage 2', 'Stage 10', 'Off', 'Blank', 'Broken', 'Pending']);
  expect(order('margin', true)).toEqual(['Off', 'Stage 10', 'stage 2', 'Blank', 'Broken', 'Pending']);
  expect(order('fets', true).at(-1)).toBe('Pending');
});

test('names go by their numbers and without regard to case', () => {
  expect(order('name', false)).toEqual(['Blank', 'Broken', 'Off', 'Pending', 'stage 2', 'Stage 10']);
});

test('every column orders the sheets without losing one', () => {
  for (const { key, falling } of SHEET_COLUMNS) expect(order(key, falling).sort()).toEqual(order('name', false).sort());
});

test('words are sought in the name, the author and the state, in any order and case', () => {
  const [first] = SHEETS;
  expect(first && ['stage', 'ines STAGE', 'draft 10'].every((sought) => answersTo(first, sought))).toBe(true);
  expect(first && ['stage 2', 'samir', 'signed'].some((sought) => answersTo(first, sought))).toBe(false);
});
