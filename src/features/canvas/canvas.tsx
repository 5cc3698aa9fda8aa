import {
  type MouseEvent,
  type PointerEvent,
  useCallback,
  useEffect,
  useLayoutEffect,
  useMemo,
  useRef,
  useState,
} from 'react';
import { ReactFlowProvider, useStoreApi } from 'reactflow';
import type { PartId, WireEnd } from '#shared/circuit/drawing';
import { terminalKey } from '#shared/circuit/nets';
import type { GridPoint } from '#shared/geometry/place';
import './canvas.css';
import { type CanvasParts, CanvasPartsProvider } from './canvas-context';
import type { CanvasProps } from './canvas-props';
import type { Desk } from './desk';
import { asWireId, useFlowElements } from './flow-elements';
import { HandMarks } from './hand-marks';
import { hintFor } from './hint';
import { handleKey, handleKeyUp } from './keyboard';
import { KeysDialog, useKeysDialog } from './keys-dialog';
import { litNet } from './lit-net';
import { Marks } from './marks';
import { NetMarks } from './net-marks';
import { spokenPart } from './part-text';
import { pressWire } from './press-wire';
import { SheetFlow } from './sheet-flow';
import type { SheetGeometry } from './sheet-geometry';
import { SlipOverlay } from './slip-overlay';
import { partBox } from './symbol-box';
import { Tray } from './tray';
import { useBending } from './use-bending';
import { useFlowChanges } from './use-flow-changes';
import { useLatest } from './use-latest';
import { useMoving } from './use-moving';
import { usePlacing } from './use-placing';
import { useSheetPicture } from './use-sheet-picture';
import { useView } from './use-view';
import { useWiring } from './use-wiring';
import { ViewSharing } from './view-sharing';
import { ViewportLayer } from './viewport-layer';

const unknownRegion = () => undefined;

/** The drawing with its tray. It shows what it is given and asks for changes through `commands` alone. */
export function Canvas(props: CanvasProps) {
  return (
    <ReactFlowProvider>
      <Board {...props} />
    </ReactFlowProvider>
  );
}

function Board(props: CanvasProps) {
  const { drawing, nets, commands, selection, onSelect, announce, slip, slipPart, frame } = props;
  const { Tag, PartProblem, NetVoltage, useRegion = unknownRegion } = props;
  const [voltages, setVoltages] = useState(true);
  const keys = useKeysDialog();
  const [hovered, setHovered] = useState<string>();
  const board = useRef<HTMLElement>(null);
  const pointer = useRef<GridPoint>(undefined);
  const selectedAtPress = useRef(selection);
  const view = useView();
  useQuietStrictMode();

  const { elsewhere, hands: moving } = useMoving(drawing, commands, announce);
  const shownGeometry = useRef<SheetGeometry>(undefined);
  const { bent, hands: bending } = useBending({ drawing, geometry: shownGeometry, commands, announce });
  const inHand = useMemo(() => ({ elsewhere, bent }), [elsewhere, bent]);
  const { geometry, graph, texts } = useSheetPicture(drawing, nets, inHand);
  useLayoutEffect(() => {
    shownGeometry.current = geometry;
  }, [geometry]);
  const latestPicture = useLatest({ geometry, texts });

  const placed = useRef<PartId>(undefined);
  const onPlaced = (part: PartId) => {
    placed.current = part;
    onSelect({ parts: new Set([part]), wires: new Set() });
  };
  const { placing, hands: placingHands } = usePlacing(commands, announce, onPlaced);
  useEffect(() => {
    const part = placed.current && geometry.parts.get(placed.current);
    if (!part) return;
    placed.current = undefined;
    announce(`Placed ${spokenPart(part)} at ${part.place.x}, ${part.place.y}.`);
  }, [geometry, announce]);

  const sheet = { drawing, geometry, nets, commands, announce, toSheet: view.toSheet };
  const { wiring, hands: wiringHands } = useWiring(sheet);

  const parts = useMemo(
    (): CanvasParts => ({
      Tag,
      PartProblem,
      useRegion,
      // A click on a terminal with a part in the hand sets the part down there; it begins no wire.
      pressTerminal: (end, event) => {
        if (!placingHands.now()) wiringHands.press(end, event);
      },
      pressWire: commands.canEdit
        ? (wire, event) => {
            if (!placingHands.now() && !wiringHands.now()) pressWire(wire, event, bending, view.toSheet);
          }
        : undefined,
    }),
    [Tag, PartProblem, useRegion, wiringHands, placingHands, bending, commands.canEdit, view],
  );
  const { nodes, edges } = useFlowElements(drawing, geometry, nets, selection, slipPart, texts);
  const lit = useMemo(
    () => litNet(hovered === undefined ? undefined : asWireId(hovered), drawing, geometry, nets),
    [hovered, drawing, geometry, nets],
  );

  const focus = useCallback((selector: string) => {
    board.current?.querySelector<HTMLElement>(selector)?.focus({ preventScroll: true });
  }, []);
  const focusDrawing = () => board.current?.focus({ preventScroll: true });
  const reveal = (id: PartId) => {
    const part = geometry.parts.get(id);
    if (part) view.reveal(partBox(part));
  };
  const middleOfSelected = (): GridPoint | undefined => {
    const [id] = selection.parts;
    const part = id === undefined ? undefined : geometry.parts.get(id);
    return part && { x: part.place.x + 100, y: part.place.y };
  };
  const desk: Desk = {
    geometry,
    commands,
    selection,
    get selectedAtPress() {
      return selectedAtPress.current;
    },
    moving,
    bending,
    placing: placingHands,
    wiring: wiringHands,
    slipOpen: slipPart !== undefined,
    wiresAt: ({ part, pin }: WireEnd) =>
      new Set(
        drawing.wires
          .filter(({ from, to }) => [from, to].some((end) => end.part === part && end.pin === pin))
          .map(({ id }) => id),
      ),
    terminalAt: (end) => geometry.terminals.get(terminalKey(end))?.at,
    spokenWire: (id) => edges.find((edge) => edge.id === id)?.ariaLabel ?? 'Wire',
    select: onSelect,
    placingStart: () => pointer.current ?? middleOfSelected() ?? view.middle(),
    focusPart(id) {
      reveal(id);
      focus(`[data-part="${id}"]`);
    },
    focusTerminal({ part, pin }) {
      reveal(part);
      focus(`[data-nodeid="${part}"][data-handleid="${pin}"]`);
    },
    focusDrawing,
    openSlip: (id) => {
      const kind = geometry.parts.get(id)?.kind;
      if (kind !== undefined && kind !== 'ground' && kind !== 'junction') props.onOpenSlip(id);
    },
    closeSlip() {
      props.onCloseSlip();
      if (slipPart !== undefined) focus(`[data-part="${slipPart}"]`);
    },
    showKeys: keys.show,
    announce,
  };
  const latestDesk = useLatest(desk);
  const changes = useFlowChanges(latestDesk);

  // biome-ignore lint/correctness/useExhaustiveDependencies: only a new request frames again, not a part that moved
  useEffect(() => {
    const part = frame && geometry.parts.get(frame.part);
    if (part) view.frame(partBox(part));
  }, [frame?.request]);

  const fit = useCallback(() => {
    const { geometry, texts } = latestPicture.current;
    view.fit(geometry, texts);
  }, [view, latestPicture]);

  const onPointerMove = (event: PointerEvent) => {
    const at = view.toSheet({ x: event.clientX, y: event.clientY });
    pointer.current = at;
    props.onPointer?.(at);
    placingHands.follow(at);
    if (!wiring?.held) wiringHands.follow(at);
  };
  const onPointerLeave = () => {
    pointer.current = undefined;
    props.onPointer?.(undefined);
  };
  /** While something is in the hand, a click anywhere on the sheet is about that alone. */
  const onClickCapture = (event: MouseEvent) => {
    if (event.target instanceof Element && event.target.closest('[data-own-keys]')) return;
    const at = view.toSheet({ x: event.clientX, y: event.clientY });
    const meaning = wiringHands.meaningOfClick();
    if (placingHands.now()) {
      placingHands.follow(at);
      placingHands.put();
    } else if (meaning === 'ties') {
      wiringHands.follow(at);
      wiringHands.tie();
    } else if (meaning === 'not-ours') return;
    event.stopPropagation();
  };

  const slipOn = slipPart === undefined ? undefined : geometry.parts.get(slipPart);
  return (
    <div className="canvas">
      <section
        ref={board}
        className="drawing"
        // biome-ignore lint/a11y/noNoninteractiveTabindex: the drawing is one stop of the Tab key and has keys of its own
        tabIndex={0}
        role="application"
        aria-label="Drawing"
        data-can-edit={commands.canEdit || undefined}
        data-wiring={wiring !== undefined || undefined}
        data-placing={placing !== undefined || undefined}
        onKeyDown={(event) => handleKey(event, desk)}
        onKeyUp={(event) => handleKeyUp(event, desk)}
        onPointerDownCapture={() => {
          selectedAtPress.current = selection;
          wiringHands.newPress();
        }}
        onPointerMove={onPointerMove}
        onPointerLeave={onPointerLeave}
        onClickCapture={onClickCapture}
      >
        <CanvasPartsProvider value={parts}>
          <SheetFlow
            nodes={nodes}
            edges={edges}
            draggable={commands.canEdit && placing === undefined && wiring === undefined}
            onReady={fit}
            onWireHover={setHovered}
            onDragStart={moving.begin}
            onDragStop={moving.drop}
            {...changes}
          />
        </CanvasPartsProvider>
        <NetMarks dots={graph.dots} spots={texts.spots} lit={lit} voltages={voltages} NetVoltage={NetVoltage} />
        <ViewportLayer>
          <Marks geometry={geometry} selected={selection.parts} lit={props.lit} others={props.others} />
          <HandMarks placing={placing} wiring={wiring} geometry={geometry} />
        </ViewportLayer>
        <ViewSharing followed={props.followed} onView={props.onView} onLeave={props.onLeaveFollowed} />
        {slip !== undefined && slipOn && (
          <SlipOverlay
            key={slipOn.id}
            part={slipOn}
            beside={(texts.tags.get(slipOn.id) ?? texts.labels.get(slipOn.id))?.grows}
            onFocusLost={() => focus(`[data-part="${slipOn.id}"]`)}
          >
            {slip}
          </SlipOverlay>
        )}
      </section>
      <Tray
        canEdit={commands.canEdit}
        inHand={placing?.kind}
        hint={hintFor(placing, wiring, geometry)}
        voltages={voltages}
        onVoltages={setVoltages}
        onFit={fit}
        onKeys={keys.show}
        onTake={(kind) => {
          if (placing?.kind === kind) placingHands.end();
          else placingHands.begin(kind, view.middle());
          focusDrawing();
        }}
        onDrag={(kind, at) => {
          if (placingHands.now()?.kind !== kind) placingHands.begin(kind, view.toSheet(at));
          placingHands.follow(view.toSheet(at));
        }}
        onDragEnd={({ x, y }) => {
          if (board.current?.contains(document.elementFromPoint(x, y))) placingHands.put();
          placingHands.end();
          focusDrawing();
        }}
      />
      <KeysDialog open={keys.shown} onOpenChange={keys.onOpenChange} />
    </div>
  );
}

/** React's StrictMode makes React Flow v11 believe, in development, that its constants are made anew (warning 002). */
function useQuietStrictMode() {
  const store = useStoreApi();
  useState(() =>
    store.setState({
      onError: (code, message) => {
        if (code !== '002') console.warn(message);
      },
    }),
  );
}
