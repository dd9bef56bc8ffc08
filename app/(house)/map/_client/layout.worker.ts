import { type MapPoint, mapLayout } from '@/engine/map/map-layout';
import type { RelatedLink } from '@/lib/shared/related';

export interface LayoutRequest {
  key: string;
  ids: string[];
  links: Pick<RelatedLink, 'a' | 'b' | 'similarity'>[];
}
export interface LayoutAnswer {
  key: string;
  points: MapPoint[];
}

const SEED = 20;
/** Fewer steps for many materials: a step costs about n log n, and nobody waits longer than some seconds. */
const stepsFor = (count: number) => Math.round(Math.min(320, Math.max(60, 160_000 / Math.max(1, count))));

self.onmessage = ({ data }: MessageEvent<LayoutRequest>) => {
  const { key, ids, links } = data;
  const points = mapLayout(ids, links, { ticks: stepsFor(ids.length), seed: SEED });
  self.postMessage({ key, points } satisfies LayoutAnswer);
};
