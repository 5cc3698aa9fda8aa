import { Tabs } from 'radix-ui';
import { useCallback, useDeferredValue, useMemo, useState } from 'react';
import { type Drawing, isComponent, type PartId } from '#shared/circuit/drawing';
import type { DrawnNets } from '#shared/circuit/nets';
import { dimmed } from '../../formats/dimmed';
import type { Selection } from '../../live/selection';
import {
  type Solution,
  useIsOtherPoint,
  useProblems,
  useShownPoint,
  useSolution,
  useVdsScale,
} from '../../workers/solution';
import { fetRows } from './fet-rows';
import { FetTable } from './fet-table';
import { LedgerFrame } from './ledger-frame';
import { netRows, partRows } from './part-rows';
import { NetTable, PartTable } from './part-table';
import { ProblemList } from './problem-list';

type LedgerProps = {
  drawing: Drawing;
  nets: DrawnNets;
  selection: Selection;
  onSelect(selection: Selection): void;
  /** The part to light in the drawing while its row is pointed at or focused. */
  onLight(part: PartId | undefined): void;
  /** Bring this part into view. */
  onFrame(part: PartId): void;
  /** Open this part's slip. */
  onOpen(part: PartId): void;
  /** Edit the selected parts together; left out where nobody may. */
  onEditSelected?: (() => void) | undefined;
};

type Tab = 'fets' | 'parts' | 'nets' | 'problems';

/** The tables under the drawing. They hold all that the drawing holds, and the same figures. */
export function Ledger({ drawing, nets, selection, onSelect, onLight, onFrame, onOpen, onEditSelected }: LedgerProps) {
  const solution = useSolution();
  const scaleEnd = useVdsScale();
  const point = useShownPoint();
  const problems = useProblems();
  const elsewhere = useIsOtherPoint();
  const [tab, setTab] = useState<Tab>('fets');
  const [collapsed, setCollapsed] = useState(false);

  // The drawing and its tags come first; the tables follow as soon as those are painted, and are dimmed until then.
  const now = useMemo(
    () => ({ drawing, nets, solution, scaleEnd, point, problems, elsewhere }),
    [drawing, nets, solution, scaleEnd, point, problems, elsewhere],
  );
  const shown = useDeferredValue(now);
  const outdated = shown !== now || solution.state === 'outdated';
  const rows = useMemo(
    () => ({
      fets: fetRows(shown.drawing, shown.point),
      parts: partRows(shown.drawing, shown.point),
      nets: netRows(shown.drawing, shown.nets, shown.point),
    }),
    [shown.drawing, shown.nets, shown.point],
  );
  const empty = !drawing.parts.some(isComponent);
  const selectParts = useCallback((parts: ReadonlySet<PartId>) => onSelect({ parts, wires: new Set() }), [onSelect]);
  const goTo = (part: PartId) => {
    selectParts(new Set([part]));
    onFrame(part);
  };
  const common = { selected: selection.parts, onLight, onFrame, onOpen, onSelectParts: selectParts };
  const selectedComponents = drawing.parts.filter((part) => isComponent(part) && selection.parts.has(part.id)).length;
  const open = (next: Tab) => {
    setTab(next);
    setCollapsed(false);
  };

  return (
    <Tabs.Root value={tab} onValueChange={(next) => open(next as Tab)}>
      <LedgerFrame
        collapsed={collapsed}
        onCollapse={setCollapsed}
        action={
          onEditSelected &&
          selectedComponents > 1 && (
            <button
              type="button"
              className="min-h-6 text-xs underline decoration-edge underline-offset-4 hover:decoration-current"
              onClick={onEditSelected}
            >
              edit {selectedComponents} selected
            </button>
          )
        }
        tabs={
          <Tabs.List aria-label="Tables" className="flex flex-wrap gap-x-4 pl-4 text-xs sm:pl-6">
            <TabName tab="fets" count={rows.fets.length} onOpen={open}>
              FETs
            </TabName>
            <TabName tab="parts" count={rows.parts.length} onOpen={open}>
              other parts
            </TabName>
            <TabName tab="nets" count={rows.nets.length} onOpen={open}>
              nets
            </TabName>
            <TabName tab="problems" count={empty ? 0 : shown.problems.length} onOpen={open}>
              problems
            </TabName>
          </Tabs.List>
        }
      >
        {empty ? (
          <p className="px-4 py-3 text-xs sm:px-6">
            Nothing is drawn yet. To begin, choose a part from the tray, or press its letter while the drawing has the
            focus, then place it; each FET gets its row here.
          </p>
        ) : (
          <div aria-busy={outdated} className={dimmed(outdated)}>
            {tab !== 'problems' && <Unsolved solution={shown.solution} drawing={drawing} onFrame={goTo} />}
            <Tabs.Content value="fets">
              {rows.fets.length > 0 ? (
                <FetTable rows={rows.fets} scaleEnd={shown.scaleEnd} {...common} />
              ) : (
                <p className="px-4 py-3 text-faint text-xs sm:px-6">There is no FET on this sheet yet.</p>
              )}
            </Tabs.Content>
            <Tabs.Content value="parts">
              <PartTable rows={rows.parts} {...common} />
            </Tabs.Content>
            <Tabs.Content value="nets">
              <NetTable rows={rows.nets} {...common} />
            </Tabs.Content>
            <Tabs.Content value="problems">
              {shown.elsewhere && (
                <p className="px-4 pt-2 text-faint text-xs sm:px-6">
                  Remarks on devices and nets at this operating point: –. They are made for the first point alone.
                </p>
              )}
              {shown.problems.length > 0 ? (
                <ProblemList problems={shown.problems} drawing={drawing} onFrame={goTo} />
              ) : (
                <p className="px-4 py-3 text-faint text-xs sm:px-6">No problem was found.</p>
              )}
            </Tabs.Content>
          </div>
        )}
      </LedgerFrame>
    </Tabs.Root>
  );
}

function TabName({
  tab,
  count,
  onOpen,
  children,
}: {
  tab: Tab;
  count: number;
  onOpen: (tab: Tab) => void;
  children: string;
}) {
  return (
    <Tabs.Trigger
      value={tab}
      // A tab that is chosen already opens a collapsed ledger too.
      onClick={() => onOpen(tab)}
      className="min-h-7 border-transparent border-b text-faint hover:text-ink data-[state=active]:border-ink data-[state=active]:text-ink"
    >
      {children} {count}
    </Tabs.Trigger>
  );
}

/** Why there are no figures. */
function Unsolved({
  solution,
  drawing,
  onFrame,
}: {
  solution: Solution;
  drawing: Drawing;
  onFrame: (part: PartId) => void;
}) {
  if (solution.state === 'failed') return <p className="px-4 py-2 text-missed text-xs sm:px-6">{solution.reason}</p>;
  if (solution.state === 'pending' || solution.record.status === 'solved') return null;
  const errors = solution.record.problems.filter(({ severity }) => severity === 'error');
  return (
    <div>
      <p className="px-4 pt-2 font-bold text-missed text-xs sm:px-6">The circuit could not be solved.</p>
      <ProblemList problems={errors} drawing={drawing} onFrame={onFrame} />
    </div>
  );
}
