import { FacetSwatch } from '@/app/_components/facet-swatch';
import type { FacetView } from '@/lib/shared/facet';
import { facetColour } from '@/lib/shared/facet-colour';

interface ProfileSpreadProps {
  facets: readonly FacetView[];
  profile: readonly number[];
  sd: readonly number[];
}

const points = new Intl.NumberFormat('en-GB', { minimumFractionDigits: 1, maximumFractionDigits: 1 });
const along = (intensity: number) => `${Math.max(0, Math.min(10, intensity)) * 10}%`;

/** How strongly each facet is smelt, and how far noses differ: a bar, and a whisker of one standard deviation each way. */
export function ProfileSpread({ facets, profile, sd }: ProfileSpreadProps) {
  const rows = facets
    .map((facet, place) => ({ facet, intensity: profile[place] ?? 0, spread: sd[place] ?? 0 }))
    .filter(({ intensity }) => intensity > 0)
    .sort((a, b) => b.intensity - a.intensity);
  return (
    <table className="w-full border-collapse">
      <caption className="sr-only">Facets from the strongest, on a scale from 0 to 10</caption>
      <thead>
        <tr className="narrow text-left text-ink-soft">
          <th scope="col" className="w-[1%] pb-1 font-normal whitespace-nowrap">
            Facet
          </th>
          <th scope="col" className="pb-1 pl-4 font-normal">
            <span className="flex justify-between" aria-hidden="true">
              {[0, 2, 4, 6, 8, 10].map((mark) => (
                <span key={mark}>{mark}</span>
              ))}
            </span>
            <span className="sr-only">Intensity</span>
          </th>
          <th scope="col" className="w-[1%] pb-1 pl-4 text-right font-normal whitespace-nowrap">
            0–10, ± spread
          </th>
        </tr>
      </thead>
      <tbody>
        {rows.map(({ facet, intensity, spread }) => (
          <tr key={facet.id} className="border-t border-grout">
            <th scope="row" className="py-1.5 text-left font-normal whitespace-nowrap" title={facet.description}>
              <span className="inline-flex items-center gap-2.5">
                <FacetSwatch facet={facet} />
                {facet.name}
              </span>
            </th>
            <td className="pl-4">
              <Bar facet={facet} intensity={intensity} spread={spread} />
            </td>
            <td className="figures pl-4 text-right whitespace-nowrap">
              {points.format(intensity)} <span className="text-ink-soft">± {points.format(spread)}</span>
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function Bar({ facet, intensity, spread }: { facet: FacetView; intensity: number; spread: number }) {
  const [from, to] = [Math.max(0, intensity - spread), Math.min(10, intensity + spread)];
  return (
    <span aria-hidden="true" className="relative block h-5">
      {[2, 4, 6, 8, 10].map((mark) => (
        <span key={mark} className="absolute inset-y-0 w-px bg-grout" style={{ left: along(mark) }} />
      ))}
      <span
        className="absolute inset-y-[3px] left-0 border border-ink"
        style={{ width: along(intensity), background: facetColour(facet) }}
      />
      <span className="absolute top-1/2 h-px bg-ink" style={{ left: along(from), width: along(to - from) }} />
      <span className="absolute inset-y-[6px] w-px bg-ink" style={{ left: along(from) }} />
      <span className="absolute inset-y-[6px] w-px bg-ink" style={{ left: along(to) }} />
      <span className="absolute inset-y-0 left-0 w-px bg-ink" />
    </span>
  );
}
