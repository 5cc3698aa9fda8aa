import { useCallback, useEffect, useLayoutEffect, useMemo, useRef, useState } from 'react';
import { ReactFlowProvider, useStore } from 'reactflow';
import type { PartId, WireEnd } from '#shared/circuit/drawing';
import { terminalKey } from '#shared/circuit/nets';
import type { GridPoint } from '#shared/geometry/place';
import './canvas.css';
import { CanvasPartsProvider } from './canvas-context';
import type { CanvasProps } from './canvas-props';
import { CurrentMarks } from './current-marks';
import type { Desk } from './desk';
import { asWireId, useFlowElements } from './flow-elements';
import { boxOf, type Found, selectionOf } from './found-things';
import { HandMarks } from './hand-marks';
import { hintFor } from './hint';
import { handleKey, handleKeyUp } from './keyboard';
import { litNet } from './lit-net';
import { Marks } from './marks';
import { NetMarks } from './net-marks';
import { Panels } from './panels';
import { hasSlip } from './part-keys';
import { SheetFlow } from './sheet-flow';
import type { SheetGeometry } from './sheet-geometry';
import { SlipOverlay } from './slip-overlay';
import { partBox } from './symbol-box';
import { Tray } from './tray';
import { useArrivals } from './use-arrivals';
import { useBending } from './use-bending';
import { useBoardPointer } from './use-board-pointer';
import { useClipboard } from './use-clipboard';
import { useFlowChanges } from './use-flow-changes';
import { useJoinedParts } from './use-joined-parts';
import { useLatest } from './use-latest';
import { useMarquee } from './use-marquee';
import { useMoving } from './use-moving';
import { menuPlace, usePanels } from './use-panels';
import { usePlacing } from './use-placing';
import { useQuietStrictMode } from './use-quiet-strict-mode';
import { useSaid } from './use-said';
import { useSeveral } from './use-several';
import { useSheetPicture } from './use-sheet-picture';
import { FAR_ZOOM, useView } from './use-view';
import { useWiring } from './use-wiring';
import { ViewSharing } from './view-sharing';
import { ViewportLayer } from './viewport-layer';

const unknown = () => undefined;

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
  const { NetVoltage, useTerminalCurrent = unknown } = props;
  const [voltages, setVoltages] = useState(true);
  const [withCurrents, setWithCurrents] = useState(false);
  const panels = usePanels();
  const { said, say, hush } = useSaid(announce);
  const [hovered, setHovered] = useState<string>();
  const board = useRef<HTMLElement>(null);
  const pointer = useRef<GridPoint>(undefined);
  const selectedAtPress = useRef(selection);
  const { several, setSeveral } = useSeveral(board);
  const view = useView();
  const far = useStore(({ transform }) => transform[2] < FAR_ZOOM);
  useQuietStrictMode();

  const { elsewhere, hands: moving } = useMoving(drawing, commands, announce);
  const shownGeometry = useRef<SheetGeometry>(undefined);
  const { bent, hands: bending } = useBending({ drawing, geometry: shownGeometry, commands, announce });
  const inHand = useMemo(() => ({ elsewhere, bent }), [elsewhere, bent]);
  const { geometry, graph, texts, currents } = useSheetPicture(drawing, nets, inHand, withCurrents);
  useLayoutEffect(() => {
    shownGeometry.current = geometry;
  }, [geometry]);
  const latestPicture = useLatest({ geometry, texts });

  const arrivals = useArrivals({
    geometry,
    view,
    select: onSelect,
    announce,
    onSetDown({ id, kind }) {
      // One writes a note at once, and seldom two.
      if (kind === 'note' && placingHands.end()) props.onOpenSlip(id);
    },
  });
  const { placing, hands: placingHands } = usePlacing(commands, announce, (part) =>
    arrivals.setDown({ parts: new Set([part]), wires: new Set() }),
  );

  const sheet = { drawing, geometry, nets, commands, announce, toSheet: view.toSheet };
  const { wiring, hands: wiringHands } = useWiring(sheet);
  const { marquee, hands: marqueeHands } = useMarquee({ ...sheet, selection, select: onSelect });

  const joined = useJoinedParts(props, { placing: placingHands, wiring: wiringHands, bending }, view);
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
    drawing,
    geometry,
    commands,
    selection,
    several,
    get selectedAtPress() {
      return selectedAtPress.current;
    },
    moving,
    marquee: marqueeHands,
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
    pointerOrMiddle: () => pointer.current ?? view.middle(),
    arrived: arrivals.copied,
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
      const part = geometry.parts.get(id);
      if (part && hasSlip(part)) props.onOpenSlip(id);
    },
    closeSlip() {
      props.onCloseSlip();
      if (slipPart !== undefined) focus(`[data-part="${slipPart}"]`);
    },
    show: (panel, at) => panels.show(panel, at ?? menuPlace(board.current, selection)),
    announce,
    say,
  };
  const latestDesk = useLatest(desk);
  const changes = useFlowChanges(latestDesk);
  useClipboard(board, latestDesk);

  useEffect(() => {
    // A new request frames again; a part that moved meanwhile does not.
    const part = frame && latestPicture.current.geometry.parts.get(frame.part);
    if (part) view.frame(partBox(part));
  }, [frame, view, latestPicture]);

  const fit = useCallback(() => {
    const { geometry, texts } = latestPicture.current;
    view.fit(geometry, texts);
  }, [view, latestPicture]);

  const { spaceWasTap, handlers } = useBoardPointer({
    desk,
    view,
    pointer,
    several,
    hush,
    onPress() {
      selectedAtPress.current = selection;
    },
    onPointer: props.onPointer,
  });
  const goTo = (found: Found): HTMLElement | null => {
    const selection = selectionOf(found, drawing, nets);
    onSelect(selection);
    const box = boxOf(selection, geometry);
    if (box) view.frame(box);
    const [part] = selection.parts;
    return board.current?.querySelector<HTMLElement>(`[data-part="${part}"]`) ?? board.current;
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
        data-far={far || undefined}
        data-can-edit={commands.canEdit || undefined}
        data-wiring={wiring !== undefined || undefined}
        data-placing={placing !== undefined || undefined}
        onKeyDown={(event) => handleKey(event, desk)}
        onKeyUp={(event) => handleKeyUp(event, desk, spaceWasTap())}
        {...handlers}
      >
        <CanvasPartsProvider value={joined}>
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
        <CurrentMarks spots={currents} useTerminalCurrent={useTerminalCurrent} />
        <ViewportLayer>
          <Marks
            geometry={geometry}
            selected={(marquee?.selection ?? selection).parts}
            lit={props.lit}
            others={props.others}
          />
          <HandMarks placing={placing} wiring={wiring} marquee={marquee} geometry={geometry} />
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
        hint={hintFor(placing, wiring, geometry, said)}
        voltages={voltages}
        onVoltages={setVoltages}
        currents={withCurrents}
        onCurrents={setWithCurrents}
        onFit={fit}
        several={several}
        onSeveral={setSeveral}
        onFind={() => desk.show('find')}
        onActions={(at) => desk.show('actions', at)}
        onKeys={() => desk.show('keys')}
        onTake={(kind) => {
          if (placing?.kind === kind) placingHands.end();
          else placingHands.begin(kind, view.middle());
          focusDrawing();
        }}
        onDrag={(kind, at, begins) => {
          if (begins) placingHands.begin(kind, view.toSheet(at));
          // The keys are the drawing's from here: Escape calls it off.
          if (begins) focusDrawing();
          placingHands.follow(view.toSheet(at));
        }}
        onDragEnd={(at) => {
          if (at && board.current?.contains(document.elementFromPoint(at.x, at.y))) placingHands.put();
          placingHands.end();
          focusDrawing();
        }}
      />
      <Panels panel={panels.panel} at={panels.at} desk={desk} nets={nets} onClose={panels.close} goTo={goTo} />
    </div>
  );
}
