import type { FacetTone } from '@/lib/shared/facet';
import { facetColour } from '@/lib/shared/facet-colour';

/** A facet's colour as a short piece of strip. Its name always stands beside it. */
export function FacetSwatch({ facet }: { facet: Pick<FacetTone, 'hueDeg' | 'lightness'> | undefined }) {
  return (
    <span
      aria-hidden="true"
      className="h-5 w-2 flex-none rounded-t-strip rounded-b-[1px] border border-ink"
      style={facet ? { background: facetColour(facet) } : undefined}
    />
  );
}
