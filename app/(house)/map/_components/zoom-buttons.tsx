import type { RefObject } from 'react';
import type { GraphHandle } from './graph-canvas';

const STEP_PX = 140;
const ZOOM = 1.6;

interface Move {
  name: string;
  drawing: string;
  run: (graph: GraphHandle) => void;
}

const MOVES: readonly Move[] = [
  { name: 'Zoom in', drawing: 'M6 1v10M1 6h10', run: (graph) => graph.zoomBy(ZOOM) },
  { name: 'Zoom out', drawing: 'M1 6h10', run: (graph) => graph.zoomBy(1 / ZOOM) },
  { name: 'Show all', drawing: 'M1 4V1h3M8 1h3v3M11 8v3H8M4 11H1V8', run: (graph) => graph.showAll() },
  { name: 'Move left', drawing: 'M7.500 2 3.500 6l4 4', run: (graph) => graph.panBy(-STEP_PX, 0) },
  { name: 'Move right', drawing: 'm4.500 2 4 4-4 4', run: (graph) => graph.panBy(STEP_PX, 0) },
  { name: 'Move up', drawing: 'M2 7.500 6 3.500l4 4', run: (graph) => graph.panBy(0, -STEP_PX) },
  { name: 'Move down', drawing: 'm2 4.500 4 4 4-4', run: (graph) => graph.panBy(0, STEP_PX) },
];

/** Whatever a wheel or a finger does to the canvas, by buttons too. */
export function ZoomButtons({ handle }: { handle: RefObject<GraphHandle | null> }) {
  return (
    <fieldset
      className="absolute right-3 bottom-3 flex gap-px rounded-tile border border-rule bg-grout"
      data-print="no"
    >
      <legend className="sr-only">Zoom and move the map</legend>
      {MOVES.map(({ name, drawing, run }) => (
        <button
          key={name}
          type="button"
          aria-label={name}
          title={name}
          onClick={() => handle.current && run(handle.current)}
          className="grid size-8 place-items-center bg-paper hover:bg-wash active:bg-pressed"
        >
          <svg viewBox="0 0 12 12" width="12" height="12" aria-hidden="true">
            <path d={drawing} fill="none" stroke="currentColor" strokeWidth="1.3" strokeLinecap="round" />
          </svg>
        </button>
      ))}
    </fieldset>
  );
}
