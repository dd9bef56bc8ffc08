import type { FacetTone } from '@/lib/shared/facet';
import { facetHatching } from '@/lib/shared/facet-colour';

/** The patterns behind `hatchingFill`; stands once inside each drawing, under an id that is the drawing's own. */
export function Hatchings({ id }: { id: string }) {
  const line = { stroke: 'var(--ink)', strokeWidth: 0.9, strokeOpacity: 0.34 };
  return (
    <defs>
      <pattern id={`${id}-slant`} width="5" height="5" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
        <path d="M0 0V5" {...line} />
      </pattern>
      <pattern id={`${id}-counter`} width="5" height="5" patternUnits="userSpaceOnUse" patternTransform="rotate(-45)">
        <path d="M0 0V5" {...line} />
      </pattern>
      <pattern id={`${id}-level`} width="4" height="4" patternUnits="userSpaceOnUse">
        <path d="M0 2H4" {...line} />
      </pattern>
      <pattern id={`${id}-dots`} width="5" height="5" patternUnits="userSpaceOnUse">
        <circle cx="1.5" cy="1.5" r="0.8" fill="var(--ink)" fillOpacity="0.4" />
        <circle cx="4" cy="4" r="0.8" fill="var(--ink)" fillOpacity="0.4" />
      </pattern>
    </defs>
  );
}

/** What to lay over a facet's colour so that its family can be told without seeing the hue. */
export function hatchingFill(id: string, facet: FacetTone): string {
  const hatching = facetHatching(facet);
  return hatching === 'plain' ? 'none' : `url(#${id}-${hatching})`;
}
