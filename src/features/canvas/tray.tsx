import { CircleQuestionMark, Maximize, Search } from 'lucide-react';
import { type PointerEvent as ReactPointerEvent, useRef } from 'react';
import { useViewport } from 'reactflow';
import { CATALOGUE, type CatalogueEntry } from '#shared/circuit/catalogue';
import type { DrawnKind } from '#shared/circuit/drawing';
import type { GridPoint } from '#shared/geometry/place';
import { SymbolIcon } from './symbols';
import './tray.css';

type TrayProps = {
  /** Only people who may draw have parts to place. */
  readonly canEdit: boolean;
  readonly inHand: DrawnKind | undefined;
  /** What the hand can do next. */
  readonly hint: string;
  readonly voltages: boolean;
  onVoltages(shown: boolean): void;
  readonly currents: boolean;
  onCurrents(shown: boolean): void;
  /** Clicks add to the selection and take from it, and any drag on the empty sheet frames. */
  readonly several: boolean;
  onSeveral(several: boolean): void;
  onFind(): void;
  /** Opens the menu of all that can be done, at a place of the window. */
  onActions(at: GridPoint): void;
  onFit(): void;
  onKeys(): void;
  /** Takes a part, or puts it away when it is the one in the hand. */
  onTake(kind: DrawnKind): void;
  /** A part is dragged out of the tray (`begins`: it leaves it); places are the window's. */
  onDrag(kind: DrawnKind, at: GridPoint, begins: boolean): void;
  /** Where it was let go of; undefined where the drag was called off. */
  onDragEnd(at: GridPoint | undefined): void;
};

/** The strip along the drawing's lower edge: parts to place, and how the drawing is shown. */
export function Tray(props: TrayProps) {
  const { canEdit, inHand, hint, voltages, several } = props;
  return (
    <div className="tray">
      {canEdit && (
        <div className="tray-parts" role="toolbar" aria-label="Parts to place">
          {CATALOGUE.filter(({ letter }) => letter !== undefined).map((entry) => (
            <TrayPart key={entry.kind} entry={entry} taken={entry.kind === inHand} {...props} />
          ))}
        </div>
      )}
      <p className="tray-hint">{hint}</p>
      <div className="tray-view">
        <label className="tray-toggle" title="Clicks add to the selection; a drag frames parts">
          <input type="checkbox" checked={several} onChange={(event) => props.onSeveral(event.target.checked)} />
          several
        </label>
        <button
          type="button"
          className="tray-button"
          aria-haspopup="menu"
          title="Actions (a)"
          onClick={(event) => {
            const { left, top } = event.currentTarget.getBoundingClientRect();
            props.onActions({ x: left, y: top });
          }}
        >
          actions
        </button>
        <button type="button" className="tray-button" aria-label="Find" title="Find (f)" onClick={props.onFind}>
          <Search size={15} strokeWidth={1.5} aria-hidden />
        </button>
        <button type="button" className="tray-button" onClick={props.onFit} title="Show the whole drawing">
          <Maximize size={14} strokeWidth={1.5} aria-hidden />
          <Zoom />
          <span className="sr-only">, show the whole drawing</span>
        </button>
        <button type="button" className="tray-button" onClick={props.onKeys} aria-label="Keys" title="Keys (?)">
          <CircleQuestionMark size={16} strokeWidth={1.5} aria-hidden />
        </button>
        <label className="tray-toggle">
          <input type="checkbox" checked={voltages} onChange={(event) => props.onVoltages(event.target.checked)} />
          voltages
        </label>
        <label className="tray-toggle">
          <input
            type="checkbox"
            checked={props.currents}
            onChange={(event) => props.onCurrents(event.target.checked)}
          />
          currents
        </label>
      </div>
    </div>
  );
}

function Zoom() {
  const { zoom } = useViewport();
  return <span className="tray-zoom">{`${Math.round(zoom * 100)}\u00a0%`}</span>;
}

type TrayPartProps = Pick<TrayProps, 'onTake' | 'onDrag' | 'onDragEnd'> & { entry: CatalogueEntry; taken: boolean };

/** A press that moved further than this, in px, drags the part out. */
const DRAG_SLOP = 4;

function TrayPart({ entry: { kind, label, letter }, taken, onTake, onDrag, onDragEnd }: TrayPartProps) {
  const dragged = useRef(false);
  const onPointerDown = (down: ReactPointerEvent<HTMLButtonElement>) => {
    if (down.button !== 0) return;
    dragged.current = false;
    const button = down.currentTarget;
    // Kept while it moves, so that a touch is heard outside the tray too.
    button.setPointerCapture(down.pointerId);
    const onMove = (event: PointerEvent) => {
      const begins = !dragged.current;
      if (begins && Math.hypot(event.clientX - down.clientX, event.clientY - down.clientY) <= DRAG_SLOP) return;
      dragged.current = true;
      onDrag(kind, { x: event.clientX, y: event.clientY }, begins);
    };
    const onEnd = (event: PointerEvent) => {
      button.removeEventListener('pointermove', onMove);
      button.removeEventListener('pointerup', onEnd);
      button.removeEventListener('pointercancel', onEnd);
      // A touch that turns out to scroll the tray is called off.
      const at = event.type === 'pointerup' ? { x: event.clientX, y: event.clientY } : undefined;
      if (dragged.current) onDragEnd(at);
    };
    button.addEventListener('pointermove', onMove);
    button.addEventListener('pointerup', onEnd);
    button.addEventListener('pointercancel', onEnd);
  };
  return (
    <button
      type="button"
      className="tray-part"
      aria-pressed={taken}
      aria-label={`Place: ${label}`}
      aria-keyshortcuts={letter}
      title={`${label} (${letter})`}
      onPointerDown={onPointerDown}
      onClick={() => {
        if (!dragged.current) onTake(kind);
      }}
    >
      <SymbolIcon kind={kind} />
      <span aria-hidden="true">{letter}</span>
    </button>
  );
}
