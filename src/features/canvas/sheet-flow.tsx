import { type MouseEvent, memo } from 'react';
import ReactFlow, {
  Background,
  BackgroundVariant,
  ConnectionMode,
  type EdgeChange,
  type NodeChange,
  useStore,
} from 'reactflow';
import { GRID } from '#shared/geometry/place';
import type { PartNodeType, WireEdgeType } from './flow-elements';
import { PartNode } from './part-node';
import { LEAST_ZOOM, MOST_ZOOM } from './use-view';
import { WireEdge } from './wire-edge';

const NODE_TYPES = { part: PartNode };
const EDGE_TYPES = { wire: WireEdge };
const SNAP_GRID: [number, number] = [GRID, GRID];
/** The middle button; a mouse's first one frames parts, a finger always moves the sheet. */
const PAN_BUTTONS = [1];
const MULTI_SELECT = ['Shift', 'Control', 'Meta'];
const NO_ATTRIBUTION = { hideAttribution: true };

type SheetFlowProps = {
  readonly nodes: PartNodeType[];
  readonly edges: WireEdgeType[];
  readonly draggable: boolean;
  /** All stable functions. */
  readonly onNodesChange: (changes: NodeChange[]) => void;
  readonly onEdgesChange: (changes: EdgeChange[]) => void;
  readonly onPartClick: (id: string, event: MouseEvent) => void;
  readonly onWireHover: (id: string | undefined) => void;
  readonly onDragStart: () => void;
  readonly onDragStop: () => void;
  readonly onReady: () => void;
};

/** React Flow as this drawing uses it: it shows, pans, zooms and drags; wires, keys and deletion are the canvas's own. */
export const SheetFlow = memo(function SheetFlow(props: SheetFlowProps) {
  const { onPartClick, onWireHover } = props;
  return (
    <ReactFlow
      nodes={props.nodes}
      edges={props.edges}
      nodeTypes={NODE_TYPES}
      edgeTypes={EDGE_TYPES}
      onInit={props.onReady}
      onNodesChange={props.onNodesChange}
      onEdgesChange={props.onEdgesChange}
      onNodeClick={(event, node) => onPartClick(node.id, event)}
      onEdgeMouseEnter={(_event, edge) => onWireHover(edge.id)}
      onEdgeMouseLeave={() => onWireHover(undefined)}
      onNodeDragStart={props.onDragStart}
      onNodeDragStop={props.onDragStop}
      onSelectionDragStart={props.onDragStart}
      onSelectionDragStop={props.onDragStop}
      nodesDraggable={props.draggable}
      snapToGrid
      snapGrid={SNAP_GRID}
      // Every terminal is a source: the mode in which React Flow finds both ends of a wire among those.
      connectionMode={ConnectionMode.Loose}
      nodesConnectable={false}
      connectOnClick={false}
      nodesFocusable={false}
      edgesFocusable={false}
      disableKeyboardA11y
      deleteKeyCode={null}
      selectionKeyCode={null}
      panOnDrag={PAN_BUTTONS}
      panActivationKeyCode="Space"
      multiSelectionKeyCode={MULTI_SELECT}
      elevateNodesOnSelect={false}
      zoomOnDoubleClick={false}
      minZoom={LEAST_ZOOM}
      maxZoom={MOST_ZOOM}
      proOptions={NO_ATTRIBUTION}
    >
      <Grid />
    </ReactFlow>
  );
});

/** Small crosses; only every fifth where they would run into each other. */
function Grid() {
  const dense = useStore(({ transform }) => transform[2] >= 0.5);
  return <Background variant={BackgroundVariant.Cross} gap={dense ? GRID : GRID * 5} size={dense ? 3 : 6} />;
}
