import { stripWidth } from './draw-strip';
import type { Emphasis } from './emphasis';
import type { MapView } from './model';
import { type Box, placeLabels, type WantedLabel } from './place-labels';
import type { GraphNode } from './use-glide';
import type { GraphInks } from './use-inks';

export interface LabelScene {
  view: MapView;
  nodes: ReadonlyMap<string, GraphNode>;
  emphasis: Emphasis;
  /** Ids in the order in which they deserve a label; worked out once, not in every frame. */
  order: readonly string[];
  inks: GraphInks;
  width: number;
  height: number;
  /** Length of a strip, px. */
  length: number;
}

const MOST_LABELS = 70;
const MOST_CANDIDATES = 260;
const MOST_LETTERS = 26;

/** Names beside strips, in the size of the screen whatever the zoom. Those that would touch another are left out. */
export function drawLabels(ctx: CanvasRenderingContext2D, scene: LabelScene): void {
  const { emphasis, inks, width, height } = scene;
  const ratio = window.devicePixelRatio || 1;
  const shown = inSight(ctx.getTransform(), ratio, scene);
  ctx.save();
  ctx.setTransform(ratio, 0, 0, ratio, 0, 0);
  const font = (weight: number) => `${weight} 12px ${inks.fontFamily}`;
  ctx.font = font(500);
  const wanted = shown.slice(0, MOST_CANDIDATES).map((each): WantedLabel => {
    const important = each.id === emphasis.pointed || Boolean(emphasis.lit?.has(each.id));
    return { ...each, important, width: widthOf(ctx, each.name) };
  });
  ctx.textBaseline = 'middle';
  ctx.lineJoin = 'round';
  ctx.lineWidth = 3.5;
  ctx.strokeStyle = inks.paper;
  ctx.fillStyle = inks.ink;
  // Where most strips are faded there is nothing to be kept clear of.
  const strips = emphasis.lit ? [] : shown.map(boxOf);
  for (const { index, x, y } of placeLabels(wanted, { width, height, strips, most: MOST_LABELS })) {
    const { id = '', name = '' } = shown[index] ?? {};
    ctx.font = font(id === emphasis.pointed ? 680 : 500);
    ctx.strokeText(name, x, y);
    ctx.fillText(name, x, y);
  }
  ctx.restore();
}

interface Shown {
  id: string;
  name: string;
  x: number;
  y: number;
  halfWidth: number;
  halfHeight: number;
}

/** The strips on the screen, in px, in the order in which they deserve a label. */
function inSight({ a, e, f }: DOMMatrix, ratio: number, scene: LabelScene): Shown[] {
  const { view, nodes, order, width, height, length } = scene;
  const half = { halfWidth: stripWidth(length) / 2, halfHeight: length / 2 };
  return order.flatMap((id) => {
    const node = nodes.get(id);
    if (!node) return [];
    const [x, y] = [(a * node.x + e) / ratio, (a * node.y + f) / ratio];
    if (x < 0 || y < 0 || x > width || y > height) return [];
    return [{ id, name: shortened(view.byId.get(id)?.name ?? ''), x, y, ...half }];
  });
}

const boxOf = ({ x, y, halfWidth, halfHeight }: Shown): Box => ({
  ...{ left: x - halfWidth, right: x + halfWidth },
  ...{ top: y - halfHeight, bottom: y + halfHeight },
});

const shortened = (name: string) =>
  name.length > MOST_LETTERS ? `${name.slice(0, MOST_LETTERS - 1).trimEnd()}…` : name;

/** Measuring text is dear and names don't change. */
const widths = new Map<string, number>();
function widthOf(ctx: CanvasRenderingContext2D, name: string): number {
  const key = `${ctx.font} ${name}`;
  const known = widths.get(key);
  if (known !== undefined) return known;
  const { width } = ctx.measureText(name);
  widths.set(key, width);
  return width;
}
