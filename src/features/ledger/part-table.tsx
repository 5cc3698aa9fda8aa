import { useMemo } from 'react';
import { catalogueEntry } from '#shared/circuit/catalogue';
import type { PartId } from '#shared/circuit/drawing';
import { byReference } from '#shared/circuit/reference-order';
import { figures } from './figure-cells';
import type { LedgerColumn } from './ledger-column';
import { LedgerTable, type RowActions } from './ledger-table';
import type { NetRow, PartRow } from './part-rows';

type Common = { selected: ReadonlySet<PartId> } & RowActions;

/** Resistors, sources and the like, in order of reference. */
export function PartTable({ rows, ...rest }: { rows: readonly PartRow[] } & Common) {
  const columns = useMemo(
    (): LedgerColumn<PartRow>[] => [
      {
        key: 'ref',
        head: 'ref',
        cell: ({ part }) => part.ref,
        compare: (a, b) => byReference(a.part.ref, b.part.ref),
      },
      {
        key: 'kind',
        head: 'part',
        cell: ({ part }) => catalogueEntry(part.kind).label,
        compare: (a, b) => bySpelling(a.part.kind, b.part.kind) || a.size - b.size,
      },
      {
        key: 'value',
        head: 'value',
        cell: ({ value }) => value,
        precise: ({ preciseValue }) => preciseValue,
        compare: (a, b) => bySpelling(a.part.kind, b.part.kind) || a.size - b.size,
      },
      figures('voltage', 'V', rows, ({ voltage }) => voltage, 0),
      figures('current', 'A', rows, ({ current }) => current),
      figures('power', 'W', rows, ({ power }) => power),
    ],
    [rows],
  );
  return (
    <LedgerTable
      label="Other parts"
      columns={columns}
      rows={rows}
      rowKey={idOf}
      partOf={idOf}
      firstOrder="ref"
      {...rest}
    />
  );
}

/** Every net with its voltage to ground and the terminals on it. */
export function NetTable({ rows, ...rest }: { rows: readonly NetRow[] } & Common) {
  const columns = useMemo(
    (): LedgerColumn<NetRow>[] => [
      {
        key: 'net',
        head: 'net',
        cell: ({ name }) => name,
        compare: (a, b) => bySpelling(a.name, b.name),
      },
      figures('voltage', 'V', rows, ({ voltage }) => voltage, 0),
      {
        key: 'terminals',
        head: 'terminals',
        cell: ({ terminals }) => String(terminals.length).padStart(3, '\u00a0'),
        compare: (a, b) => a.terminals.length - b.terminals.length,
      },
      {
        key: 'parts',
        head: 'parts on it',
        cell: ({ terminals }) => terminals.join(', '),
        compare: (a, b) => bySpelling(a.terminals.join(), b.terminals.join()),
      },
    ],
    [rows],
  );
  return (
    <LedgerTable
      label="Nets"
      columns={columns}
      rows={rows}
      rowKey={nameOf}
      partOf={firstPartOf}
      firstOrder="net"
      {...rest}
      // A net is no part: its row goes to the first part on it, and is not that part's own.
      selected={NONE}
    />
  );
}

const NONE: ReadonlySet<PartId> = new Set();
const idOf = ({ part }: PartRow) => part.id;
const nameOf = ({ name }: NetRow) => name;
const firstPartOf = ({ part }: NetRow) => part?.id;

function bySpelling(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}
