import { ChevronDown, ChevronUp } from 'lucide-react';
import { type KeyboardEvent, type PointerEvent, type ReactNode, useState } from 'react';

const FIRST_HEIGHT = 216;
const LEAST = 80;
const MOST = 640;
const STEP = 24;

/** The ledger's place at the foot of the sheet: as high as it is dragged, or down to its one line of tabs. */
export function LedgerFrame({
  collapsed,
  onCollapse,
  tabs,
  action,
  children,
}: {
  collapsed: boolean;
  onCollapse: (collapsed: boolean) => void;
  tabs: ReactNode;
  /** What can be done with what is selected. */
  action?: ReactNode;
  children: ReactNode;
}) {
  const [height, setHeight] = useState(FIRST_HEIGHT);
  const resize = (next: number) => {
    onCollapse(next < LEAST);
    setHeight(Math.min(MOST, Math.max(LEAST, next)));
  };
  const drag = (event: PointerEvent<HTMLElement>) => {
    if (!event.currentTarget.hasPointerCapture(event.pointerId)) return;
    const foot = event.currentTarget.parentElement?.getBoundingClientRect().bottom ?? 0;
    resize(foot - event.clientY);
  };
  const press = (event: KeyboardEvent) => {
    const next = { ArrowUp: height + STEP, ArrowDown: height - STEP, Home: LEAST, End: MOST }[event.key];
    if (event.key === 'Enter') onCollapse(!collapsed);
    else if (next === undefined) return;
    else if (collapsed) onCollapse(false);
    else resize(next);
    event.preventDefault();
  };

  return (
    <section
      aria-label="Ledger"
      className="relative flex max-h-[60dvh] shrink-0 flex-col border-rule border-t bg-paper"
      style={{ height: collapsed ? undefined : height }}
    >
      <hr
        aria-orientation="horizontal"
        aria-label="Height of the ledger"
        aria-valuemin={LEAST}
        aria-valuemax={MOST}
        aria-valuenow={collapsed ? LEAST : height}
        tabIndex={0}
        className="overflow-visible -top-[3px] before:-inset-x-5 before:-inset-y-2.5 absolute left-1/2 z-20 h-[5px] w-6 -translate-x-1/2 cursor-row-resize touch-none border-faint border-y bg-paper before:absolute"
        onPointerDown={(event) => event.currentTarget.setPointerCapture(event.pointerId)}
        onPointerMove={drag}
        onKeyDown={press}
      />
      <div className="flex items-center gap-2 pr-2 sm:pr-4">
        {tabs}
        <span className="ml-auto">{action}</span>
        <button
          type="button"
          aria-expanded={!collapsed}
          aria-label="Ledger"
          className="grid size-7 place-items-center text-faint hover:text-ink"
          onClick={() => onCollapse(!collapsed)}
        >
          {collapsed ? <ChevronUp size={16} aria-hidden="true" /> : <ChevronDown size={16} aria-hidden="true" />}
        </button>
      </div>
      {!collapsed && <div className="min-h-0 flex-1 overflow-auto">{children}</div>}
    </section>
  );
}
