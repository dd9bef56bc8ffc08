import { useId } from 'react';
import type { FacetTone } from '@/lib/shared/facet';
import { facetColour } from '@/lib/shared/facet-colour';
import { Hatchings, hatchingFill } from './hatchings';

/** A snip of strip: the colour and hatching of one facet, always beside its name. */
export function FacetSwatch({ facet, className }: { facet: FacetTone | null; className?: string }) {
  const id = useId();
  const box = { x: 0.5, y: 0.5, width: 13, height: 13, rx: 1 };
  return (
    <svg width="14" height="14" viewBox="0 0 14 14" aria-hidden="true" className={className} style={{ flex: 'none' }}>
      <Hatchings id={id} />
      <rect {...box} style={{ fill: facet ? facetColour(facet) : 'var(--wash)' }} />
      <rect {...box} fill={facet ? hatchingFill(id, facet) : 'none'} style={{ stroke: 'var(--ink)' }} />
    </svg>
  );
}
