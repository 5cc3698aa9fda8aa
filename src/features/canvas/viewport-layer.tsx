import type { ReactNode } from 'react';
import { createPortal } from 'react-dom';
import { useStore } from 'reactflow';

/** Things that move and scale with the drawing, over its symbols. React Flow v11 has no such place of its own. */
export function ViewportLayer({ children }: { children: ReactNode }) {
  const viewport = useStore(({ domNode }) => domNode?.querySelector('.react-flow__viewport'));
  return viewport ? createPortal(<div className="viewport-layer">{children}</div>, viewport) : null;
}
