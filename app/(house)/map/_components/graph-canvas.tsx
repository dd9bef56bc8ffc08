'use client';

import { type Ref, useCallback, useEffect, useImperativeHandle, useMemo, useRef } from 'react';
import ForceGraph2D, { type ForceGraphMethods, type LinkObject, type NodeObject } from 'react-force-graph-2d';
import type { MapPoint } from '@/engine/map/map-layout';
import type { FacetView } from '@/lib/shared/facet';
import { drawLabels } from '../_client/draw-labels';
import { type DrawnStrip, drawnStrip, drawStrip, stripWidth } from '../_client/draw-strip';
import { type Emphasis, labelOrder } from '../_client/emphasis';
import type { MapView } from '../_client/model';
import { type GraphNode, useGlide } from '../_client/use-glide';
import { type GraphInks, thinner } from '../_client/use-inks';

type Node = NodeObject<GraphNode>;
type Link = LinkObject<GraphNode, { a: string; b: string; similarity: number }>;

/** What the buttons beside the canvas do, for whoever can't drag or turn a wheel. */
export interface GraphHandle {
  zoomBy: (factor: number) => void;
  panBy: (x: number, y: number) => void;
  showAll: () => void;
}

export interface GraphCanvasProps {
  handle: Ref<GraphHandle>;
  view: MapView;
  facets: readonly FacetView[];
  layout: { key: string; points: MapPoint[] };
  emphasis: Emphasis;
  inks: GraphInks;
  width: number;
  height: number;
  /** Reduced motion: nothing glides. */
  still: boolean;
  onPoint: (id: string | null, at: { x: number; y: number } | null) => void;
  onSelect: (id: string | null) => void;
}

const ZOOM_MS = 450;
const MARGIN_PX = 44;
const MANY = 1000;

/** How long a strip is on the screen: it grows more slowly than the map, so that zooming in makes room. */
const lengthPx = (zoom: number, count: number) => Math.min(62, Math.max(8, (count > MANY ? 9 : 17) * zoom ** 0.6));

export default function GraphCanvas(props: GraphCanvasProps) {
  const { handle, view, facets, layout, emphasis, inks, width, height, still, onPoint, onSelect } = props;
  const graph = useRef<ForceGraphMethods<Node, Link> | undefined>(undefined);
  const { nodes, gliding } = useGlide(layout.points, still);
  const strips = useStrips(view, facets, inks);
  const count = view.materials.length;

  const data = useMemo(() => {
    const shown = view.materials.flatMap(({ id }) => nodes.get(id) ?? []);
    const links = view.links
      .filter(({ a, b }) => nodes.has(a) && nodes.has(b))
      .map(({ a, b, similarity }): Link => ({ source: a, target: b, a, b, similarity }));
    return { nodes: shown as Node[], links };
  }, [view, nodes]);

  const order = useMemo(() => labelOrder(view, emphasis), [view, emphasis]);
  const showAll = useCallback((ms: number) => graph.current?.zoomToFit(ms, MARGIN_PX), []);
  // biome-ignore lint/correctness/useExhaustiveDependencies: once for each layout, when its nodes have their places
  useEffect(() => {
    if (gliding || data.nodes.length === 0) return;
    const frame = requestAnimationFrame(() => showAll(still ? 0 : ZOOM_MS));
    return () => cancelAnimationFrame(frame);
  }, [layout.key, gliding]);

  useImperativeHandle(handle, () => {
    const ms = still ? 0 : ZOOM_MS / 2;
    return {
      zoomBy: (factor) => graph.current?.zoom(factor * (graph.current.zoom() ?? 1), ms),
      panBy: (x, y) => {
        const zoom = graph.current?.zoom() ?? 1;
        const at = graph.current?.centerAt();
        if (at) graph.current?.centerAt(at.x + x / zoom, at.y + y / zoom, ms);
      },
      showAll: () => showAll(ms),
    };
  }, [still, showAll]);

  const drawNode = (node: Node, ctx: CanvasRenderingContext2D, zoom: number) => {
    const strip = strips.get(node.id);
    if (!strip || isOutside(node, ctx, width, height)) return;
    const isLit = emphasis.lit?.has(node.id) ?? true;
    const bold = node.id === emphasis.pointed;
    const length = (lengthPx(zoom, count) * (bold ? 1.5 : 1)) / zoom;
    ctx.globalAlpha = isLit ? 1 : 0.13;
    drawStrip(ctx, strip, { x: node.x, y: node.y, length, px: 1 / zoom, bold }, inks);
    ctx.globalAlpha = 1;
  };
  const paintPointer = (node: Node, colour: string, ctx: CanvasRenderingContext2D, zoom: number) => {
    const tall = Math.max(lengthPx(zoom, count), 24) / zoom;
    const wide = Math.max(stripWidth(lengthPx(zoom, count)), 16) / zoom;
    ctx.fillStyle = colour;
    ctx.fillRect(node.x - wide / 2, node.y - tall / 2, wide, tall);
  };
  const strengthOf = ({ a, b }: Link): 'pointed' | 'lit' | 'plain' | 'dim' => {
    if (emphasis.pointed && (a === emphasis.pointed || b === emphasis.pointed)) return 'pointed';
    if (!emphasis.lit) return 'plain';
    return emphasis.lit.has(a) && emphasis.lit.has(b) ? 'lit' : 'dim';
  };
  const colours = useMemo(
    () => ({
      pointed: thinner(inks.ink, 0.85),
      lit: thinner(inks.ink, 0.4),
      plain: thinner(inks.ink, 0.17),
      dim: thinner(inks.ink, 0.035),
    }),
    [inks],
  );
  return (
    <ForceGraph2D<GraphNode, { a: string; b: string; similarity: number }>
      ref={graph}
      graphData={data}
      width={width}
      height={height}
      backgroundColor="transparent"
      cooldownTicks={0}
      autoPauseRedraw={!gliding}
      enableNodeDrag={false}
      minZoom={0.15}
      maxZoom={12}
      nodeLabel=""
      nodeCanvasObject={drawNode}
      nodePointerAreaPaint={paintPointer}
      linkColor={(link) => colours[strengthOf(link as Link)]}
      linkWidth={(link) => (strengthOf(link as Link) === 'pointed' ? 1.6 : 1)}
      onRenderFramePost={(ctx, zoom) =>
        drawLabels(ctx, { view, order, nodes, emphasis, inks, width, height, length: lengthPx(zoom, count) })
      }
      onNodeHover={(node) => {
        const at = node ? graph.current?.graph2ScreenCoords(node.x ?? 0, node.y ?? 0) : undefined;
        onPoint(node ? node.id : null, at ?? null);
      }}
      onNodeClick={(node) => onSelect(node.id)}
      onBackgroundClick={() => onSelect(null)}
    />
  );
}

/** Bands and colours are worked out once for each material and theme, not in every frame. */
function useStrips(view: MapView, facets: readonly FacetView[], { ground }: GraphInks): Map<string, DrawnStrip> {
  const { materials } = view;
  return useMemo(
    () => new Map(materials.map((material) => [material.id, drawnStrip(material, facets, ground)])),
    [materials, facets, ground],
  );
}

/** The canvas is drawn in the map's units: its own transform says where that is on the screen. */
function isOutside({ x, y }: GraphNode, ctx: CanvasRenderingContext2D, width: number, height: number): boolean {
  const { a, e, f } = ctx.getTransform();
  const ratio = window.devicePixelRatio || 1;
  const [left, top] = [(a * x + e) / ratio, (a * y + f) / ratio];
  return left < -40 || top < -60 || left > width + 40 || top > height + 60;
}
