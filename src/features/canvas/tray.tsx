import { CircleQuestionMark, Maximize } from 'lucide-react';
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
  onFit(): void;
  onKeys(): void;
  /** Takes a part, or puts it away when it is the one in the hand. */
  onTake(kind: DrawnKind): void;
  /** A part is dragged out of the tray; places are the window's. */
  onDrag(kind: DrawnKind, at: GridPoint): void;
  onDragEnd(at: GridPoint): void;
};

/** The strip along the drawing's lower edge: parts to place, and how the drawing is shown. */
export function Tray(props: TrayProps) {
  const { canEdit, inHand, hint, voltages } = props;
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
        <label className="tray-toggle">
          <input type="checkbox" checked={voltages} onChange={(event) => props.onVoltages(event.target.checked)} />
          voltages
        </label>
        <button type="button" className="tray-button" onClick={props.onFit} title="Show the whole drawing">
          <Maximize size={14} strokeWidth={1.5} aria-hidden />
          <Zoom />
          <span className="sr-only">, show the whole drawing</span>
        </button>
        <button type="button" className="tray-button" onClick={props.onKeys} aria-label="Keys" title="Keys">
          <CircleQuestionMark size={16} strokeWidth={1.5} aria-hidden />
        </button>
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
      if (Math.hypot(event.clientX - down.clientX, event.clientY - down.clientY) > DRAG_SLOP) dragged.current = true;
      if (dragged.current) onDrag(kind, { x: event.clientX, y: event.clientY });
    };
    const onEnd = (event: PointerEvent) => {
      button.removeEventListener('pointermove', onMove);
      button.removeEventListener('pointerup', onEnd);
      button.removeEventListener('pointercancel', onEnd);
      if (dragged.current) onDragEnd({ x: event.clientX, y: event.clientY });
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
