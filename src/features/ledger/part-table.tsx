import { useMemo } from 'react';
import { catalogueEntry } from '#shared/circuit/catalogue';
import type { PartId } from '#shared/circuit/drawing';
import { byReference } from '#shared/circuit/reference-order';
import { figures } from './figure-cells';
import { type LedgerColumn, LedgerTable, type RowActions } from './ledger-table';
import type { NetRow, PartRow } from './part-rows';

type Common = { selected: ReadonlySet<PartId>; busy: boolean } & RowActions;

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
      { key: 'kind', head: 'part', cell: ({ part }) => catalogueEntry(part.kind).label },
      { key: 'value', head: 'value', cell: ({ value }) => value },
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
      rowKey={({ part }) => part.id}
      partOf={({ part }) => part.id}
      firstOrder={{ key: 'ref', falling: false }}
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
        compare: (a, b) => (a.name < b.name ? -1 : a.name > b.name ? 1 : 0),
      },
      figures('voltage', 'V', rows, ({ voltage }) => voltage, 0),
      { key: 'terminals', head: 'terminals', cell: ({ terminals }) => terminals.join(', ') },
    ],
    [rows],
  );
  return (
    <LedgerTable
      label="Nets"
      columns={columns}
      rows={rows}
      rowKey={({ name }) => name}
      partOf={({ part }) => part?.id}
      firstOrder={{ key: 'net', falling: false }}
      {...rest}
    />
  );
}
