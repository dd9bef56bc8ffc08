import { useEffect, useRef, useState } from 'react';
import type { MapPoint } from '@/engine/map/map-layout';
import type { LayoutAnswer, LayoutRequest } from './layout.worker';

/**
 * Where the materials stand, laid out in a worker so that the screen never stops. While a new layout is on its way the
 * last one stays. `request.key` says which layout it is; the same key is not laid out again.
 */
export function useLayout(request: LayoutRequest): { key: string; points: MapPoint[] } | null {
  const worker = useRef<Worker | null>(null);
  const known = useRef(new Map<string, MapPoint[]>());
  const [layout, setLayout] = useState<LayoutAnswer | null>(null);
  const wanted = useRef(request.key);
  wanted.current = request.key;

  useEffect(() => {
    const started = new Worker(new URL('./layout.worker.ts', import.meta.url), { type: 'module' });
    worker.current = started;
    started.onmessage = ({ data }: MessageEvent<LayoutAnswer>) => {
      known.current.set(data.key, data.points);
      if (data.key === wanted.current) setLayout(data);
    };
    return () => {
      started.terminate();
      worker.current = null;
    };
  }, []);

  const latest = useRef(request);
  latest.current = request;
  useEffect(() => {
    const points = known.current.get(request.key);
    if (points) setLayout({ key: request.key, points });
    else worker.current?.postMessage(latest.current);
  }, [request.key]);
  return layout;
}
