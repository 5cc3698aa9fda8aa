import { type CSSProperties, memo, useEffect, useRef } from 'react';
import { Handle, type NodeProps, Position, useUpdateNodeInternals } from 'reactflow';
import { bodyLedOut, type DrawnFet, type DrawnPart, isComponent, isFet } from '#shared/circuit/drawing';
import { noteLines } from '#shared/circuit/note-lines';
import type { Anchor, Box } from '#shared/geometry/box';
import { type PinPlace, pinPlaces } from '#shared/geometry/pins';
import type { GridPoint } from '#shared/geometry/place';
import { RegionGlyph } from '../../formats/region-glyph';
import { useCanvasParts } from './canvas-context';
import type { PartData } from './flow-elements';
import { nameOf, spokenPart, spokenTerminal, terminalTitle, valueText } from './part-text';
import { onPart } from './sheet-texts';
import { EMPTY_NOTE, partBox, terminalReach } from './symbol-box';
import { orientation, PartSymbol } from './symbols';

/** A part on the sheet: its symbol, terminals, texts and tag. The outer element that places it is React Flow's. */
export const PartNode = memo(function PartNode({ id, data, selected }: NodeProps<PartData>) {
  const { Tag } = useCanvasParts();
  const { part, depletion, slipOpen, written, label, tag } = data;
  const { place } = part;
  const box = partBox(part);
  const pins = pinPlaces(part.kind, place, bodyLedOut(part));

  // React Flow measures all terminals at once when they are first drawn, and cannot know that some went elsewhere.
  const updateNodeInternals = useUpdateNodeInternals();
  const terminals = pins.map(({ pin, at }) => `${pin} ${at.x - box.left} ${at.y - box.top}`).join();
  const measured = useRef(terminals);
  useEffect(() => {
    if (measured.current !== terminals) updateNodeInternals(id);
    measured.current = terminals;
  }, [id, terminals, updateNodeInternals]);

  return (
    <div className="part" data-kind={part.kind} style={{ width: box.right - box.left, height: box.bottom - box.top }}>
      {/* biome-ignore lint/a11y/useSemanticElements: React Flow drags by the element under the pointer, and a button takes no drag */}
      <div
        className={written ? 'part-face part-written' : 'part-face'}
        role="button"
        tabIndex={-1}
        aria-label={spokenPart(part)}
        aria-pressed={selected}
        data-part={id}
        data-ref={nameOf(part)}
      >
        <svg className="symbol" width="1" height="1" aria-hidden="true">
          {/* Half a pixel aside, so that hairlines fall on whole ones. */}
          <g transform={`translate(${place.x - box.left + 0.5} ${place.y - box.top + 0.5}) ${orientation(place)}`}>
            {isFet(part) && <FetOnSheet part={part} depletion={depletion} />}
            {!isFet(part) && part.kind !== 'note' && !written && <PartSymbol kind={part.kind} />}
          </g>
        </svg>
        {part.kind === 'note' && <NoteText text={part.values.text} />}
      </div>
      {pins.map((pin) => (
        <Terminal key={pin.pin} part={part} pin={pin} box={box} />
      ))}
      {label && <PartLabel part={part} anchor={onPart(label, part)} box={box} />}
      {isFet(part) && tag && !slipOpen && (
        <div className="part-tag" style={hang(onPart(tag, part), box)}>
          <Tag part={part} />
          <FarGlyph part={part} />
        </div>
      )}
    </div>
  );
});

function NoteText({ text }: { text: string }) {
  if (text.trim() === '') return <p className="note note-empty">{EMPTY_NOTE}</p>;
  return <p className="note">{noteLines(text).join('\n')}</p>;
}

/** All that is left of a tag when the drawing is seen from too far to read. */
function FarGlyph({ part }: { part: DrawnFet }) {
  const { useRegion } = useCanvasParts();
  const region = useRegion(part);
  return region === undefined ? null : (
    <span className="far-glyph" aria-hidden="true">
      <RegionGlyph region={region} />
    </span>
  );
}

/** Apart, so that a change of region draws the symbol alone. */
function FetOnSheet({ part, depletion }: { part: DrawnFet; depletion: boolean }) {
  const { useRegion } = useCanvasParts();
  const region = useRegion(part);
  return <PartSymbol kind={part.kind} region={region} depletion={depletion} bodyLedOut={bodyLedOut(part)} />;
}

function Terminal({ part, pin: { pin, at, leaves }, box }: { part: DrawnPart; pin: PinPlace; box: Box }) {
  const { pressTerminal } = useCanvasParts();
  const reach = terminalReach(part.kind);
  const label = spokenTerminal(part, pin);
  return (
    <Handle
      id={pin}
      type="source"
      position={sideOf(leaves)}
      isConnectable={false}
      isConnectableStart={false}
      className="terminal"
      style={{ left: at.x - box.left, top: at.y - box.top, width: reach, height: reach }}
      role="button"
      tabIndex={-1}
      aria-label={isComponent(part) ? label : `Terminal of ${label}`}
      data-terminal={terminalTitle(part, pin)}
      onPointerDown={(event) => pressTerminal({ part: part.id, pin }, event)}
    />
  );
}

/** Of a text that grows to the left, both ways, to the right. */
const alignments = ['right', 'center', 'left'] as const;

function PartLabel({ part, anchor, box }: { part: DrawnPart; anchor: Anchor; box: Box }) {
  const { PartProblem } = useCanvasParts();
  const value = valueText(part);
  return (
    <div className="part-label" style={{ ...hang(anchor, box), textAlign: alignments[anchor.grows.x + 1] }}>
      <div className={isComponent(part) ? 'part-ref' : 'part-net'}>{nameOf(part)}</div>
      {value !== undefined && <div className="part-value">{value}</div>}
      {isComponent(part) && !isFet(part) && <PartProblem part={part} />}
    </div>
  );
}

function hang({ at, grows }: Anchor, box: Box): CSSProperties {
  const share = (direction: number) => `${(direction - 1) * 50}%`;
  return {
    left: at.x - box.left,
    top: at.y - box.top,
    transform: `translate(${share(grows.x)}, ${share(grows.y)})`,
  };
}

function sideOf({ x, y }: GridPoint): Position {
  if (x !== 0) return x < 0 ? Position.Left : Position.Right;
  return y > 0 ? Position.Bottom : Position.Top;
}
