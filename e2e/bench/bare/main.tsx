import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import ReactFlow, { type Edge, type Node, useEdgesState, useNodesState } from 'reactflow';
import 'reactflow/dist/style.css';

/** The library by itself: as many of its own nodes and edges as the product's sheet has parts and wires, at their places. */
type Bare = { readonly nodes: Node[]; readonly edges: Edge[] };

const SNAP: [number, number] = [10, 10];

function Canvas({ bare }: { bare: Bare }) {
  const [nodes, , onNodesChange] = useNodesState(bare.nodes);
  const [edges, , onEdgesChange] = useEdgesState(bare.edges);
  return (
    <ReactFlow
      nodes={nodes}
      edges={edges}
      onNodesChange={onNodesChange}
      onEdgesChange={onEdgesChange}
      snapToGrid
      snapGrid={SNAP}
      fitView
      minZoom={0.2}
    />
  );
}

const root = document.getElementById('root');
if (!root) throw new Error('the page has a root');
const answer = await fetch('./bare.json');
createRoot(root).render(
  <StrictMode>
    <Canvas bare={await answer.json()} />
  </StrictMode>,
);
