import { useMemo } from 'react';
import type { PartId } from '#shared/circuit/drawing';
import { byReference } from '#shared/circuit/reference-order';
import { formatVoltage } from '../../formats/figures';
import { MarginRuler } from '../../formats/margin-ruler';
import { REGION_COLOUR, RegionGlyph } from '../../formats/region-glyph';
import { VERDICT_TEXT, VerdictShape } from '../../formats/verdict-shape';
import { bySlack, type FetRow, marginOf } from './fet-rows';
import { figures } from './figure-cells';
import type { LedgerColumn } from './ledger-column';
import { LedgerTable, type RowActions } from './ledger-table';

/** Letters of the longest region's name. */
const LONGEST_REGION = 9;
/** Width of the ruler in px. */
const RULER = 200;

/** The FETs of the sheet, least slack first. */
export function FetTable({
  rows,
  scaleEnd,
  ...rest
}: { rows: readonly FetRow[]; scaleEnd: number; selected: ReadonlySet<PartId> } & RowActions) {
  const columns = useMemo(() => fetColumns(rows, scaleEnd), [rows, scaleEnd]);
  return (
    <LedgerTable label="FETs" columns={columns} rows={rows} rowKey={idOf} partOf={idOf} firstOrder="margin" {...rest} />
  );
}

const idOf = ({ part }: FetRow) => part.id;

function fetColumns(rows: readonly FetRow[], scaleEnd: number): LedgerColumn<FetRow>[] {
  const volts = (name: string, pick: (row: FetRow) => number | undefined) => figures(name, 'V', rows, pick, 0);
  return [
    {
      key: 'ref',
      head: 'ref',
      cell: ({ part }) => part.ref,
      compare: (a, b) => byReference(a.part.ref, b.part.ref),
    },
    {
      key: 'region',
      head: 'region',
      cell: ({ point }) =>
        point && (
          <span className={`flex items-center gap-1.5 ${REGION_COLOUR[point.region]}`}>
            <RegionGlyph region={point.region} />
            {point.region}
          </span>
        ),
      compare: (a, b) => compareTexts(a.point?.region, b.point?.region),
    },
    figures('ID', 'A', rows, ({ point }) => point?.id),
    volts('VGS', ({ point }) => point?.vgs),
    volts('VOV', ({ point }) => point?.vov),
    volts('VDS', ({ point }) => point?.vds),
    volts('VDSsat', ({ point }) => point?.vdsSat),
    // The margin orders by slack: what it is worth depends on what was asked for.
    { ...figures('margin', 'V', rows, marginOf, -3), compare: bySlack, isMissing: hasNoStanding },
    {
      key: 'ruler',
      head: (
        <span className="flex justify-between" style={{ width: RULER }}>
          <span>0</span>
          <span>VDS</span>
          <span>{formatVoltage(scaleEnd, 1)}</span>
        </span>
      ),
      cell: ({ part, point }) =>
        point && <MarginRuler point={point} intent={part.values.intent} scaleEnd={scaleEnd} width={RULER} />,
      headText: `margin on a scale of VDS from 0 to ${formatVoltage(scaleEnd, 1)}`,
      compare: (a, b) => (marginOf(a) ?? 0) - (marginOf(b) ?? 0),
      isMissing: (row) => marginOf(row) === undefined,
    },
    {
      key: 'intent',
      head: 'intent / mV',
      cell: ({ part: { values } }) =>
        values.intent ? (
          <span className="whitespace-pre">
            {values.intent.region.padEnd(LONGEST_REGION)}
            {String(Number(((values.intent.margin ?? 0) * 1e3).toPrecision(4))).padStart(5)}
          </span>
        ) : (
          <span className="text-faint">none</span>
        ),
      compare: (a, b) =>
        compareTexts(a.part.values.intent?.region, b.part.values.intent?.region) ||
        (a.part.values.intent?.margin ?? 0) - (b.part.values.intent?.margin ?? 0),
      isMissing: ({ part }) => part.values.intent === undefined,
    },
    {
      key: 'verdict',
      head: 'verdict',
      cell: ({ standing }) =>
        standing && (
          <span className={`flex items-center gap-1.5 ${VERDICT_TEXT[standing.verdict]}`}>
            <VerdictShape verdict={standing.verdict} />
            {standing.verdict}
          </span>
        ),
      compare: bySlack,
      isMissing: hasNoStanding,
    },
    figures('gm', 'S', rows, ({ point }) => point?.gm),
    figures('ro', 'Ω', rows, ({ point }) => point && 1 / point.gds),
  ];
}

const hasNoStanding = ({ standing }: FetRow) => standing === undefined;

/** By spelling; what is missing comes last. */
function compareTexts(a: string | undefined, b: string | undefined): number {
  if (a === b) return 0;
  if (a === undefined || b === undefined) return a === undefined ? 1 : -1;
  return a < b ? -1 : 1;
}
