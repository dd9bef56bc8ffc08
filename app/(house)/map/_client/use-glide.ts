import { useEffect, useMemo, useRef, useState } from 'react';
import type { MapPoint } from '@/engine/map/map-layout';

/** A material on the canvas. The graph library adds to it, so it is kept from one view to the next. */
export interface GraphNode {
  id: string;
  x: number;
  y: number;
}

const GLIDE_MS = 650;
const ease = (part: number) => 1 - (1 - part) ** 3;

/**
 * Nodes that move to their places in a new layout, at once where motion is not wanted. `gliding` says that frames are
 * to be drawn. A node that is new begins a little nearer to the middle than where it goes.
 */
export function useGlide(points: readonly MapPoint[], still: boolean) {
  const known = useRef(new Map<string, GraphNode>());
  const [gliding, setGliding] = useState(false);
  const nodes = useMemo(() => placed(known.current, points), [points]);
  useEffect(() => {
    const moves = points.flatMap(({ id, x, y }) => {
      const node = nodes.get(id);
      return node ? [{ node, from: { x: node.x, y: node.y }, to: { x, y } }] : [];
    });
    let frame = 0;
    const begun = performance.now();
    const move = (part: number) => {
      for (const { node, from, to } of moves) {
        node.x = from.x + (to.x - from.x) * part;
        node.y = from.y + (to.y - from.y) * part;
      }
    };
    const step = (now: number) => {
      const part = Math.min(1, Math.max(0, (now - begun) / GLIDE_MS));
      move(ease(part));
      if (part < 1) frame = requestAnimationFrame(step);
      else setGliding(false);
    };
    setGliding(!still);
    if (still) move(1);
    else frame = requestAnimationFrame(step);
    return () => cancelAnimationFrame(frame);
  }, [points, nodes, still]);
  return { nodes, gliding };
}

/** The nodes of a layout. Those seen before are the same objects, standing where they stood. */
function placed(known: Map<string, GraphNode>, points: readonly MapPoint[]): Map<string, GraphNode> {
  return new Map(
    points.map(({ id, x, y }) => {
      const node = known.get(id) ?? { id, x: 0.72 * x, y: 0.72 * y };
      known.set(id, node);
      return [id, node];
    }),
  );
}
