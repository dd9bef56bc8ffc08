import { FacetSwatch } from '@/app/_components/facet-swatch';
import type { FacetView } from '@/lib/shared/facet';
import { facetColour } from '@/lib/shared/facet-colour';
import type { MaterialView } from '@/lib/shared/material-view';
import { PHASE_NAMES, PHASES } from '@/lib/shared/material-words';

interface PhaseTableProps {
  facets: readonly FacetView[];
  profile: readonly number[];
  phases: NonNullable<MaterialView['phases']>;
}

/** Only the facets that change as it dries down; those that stay are in the profile. */
export function PhaseTable({ facets, profile, phases }: PhaseTableProps) {
  const rows = facets
    .map((facet, place) => ({
      facet,
      values: PHASES.map((phase) => phases[phase]?.[place] ?? profile[place] ?? 0),
    }))
    .filter(({ values }) => values.some((value) => value !== values[0]))
    .sort((a, b) => Math.max(...b.values) - Math.max(...a.values));
  return (
    <table className="w-full border-collapse">
      <caption className="sr-only">Facets that change as it dries down, on a scale from 0 to 10</caption>
      <thead>
        <tr className="narrow text-left text-ink-soft">
          <th scope="col" className="pb-1 font-normal">
            What changes
          </th>
          {PHASES.map((phase) => (
            <th key={phase} scope="col" className="w-[23%] pb-1 pl-3 font-normal">
              {PHASE_NAMES[phase]}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map(({ facet, values }) => (
          <tr key={facet.id} className="border-t border-grout">
            <th scope="row" className="py-1.5 text-left font-normal">
              <span className="inline-flex items-center gap-2.5">
                <FacetSwatch facet={facet} />
                {facet.name}
              </span>
            </th>
            {PHASES.map((phase, place) => (
              <td key={phase} className="figures pl-3">
                <span className="flex items-center gap-2">
                  <span className="w-7 text-right">{(values[place] ?? 0).toFixed(1)}</span>
                  <span aria-hidden="true" className="h-3.5 min-w-0 flex-1 border-l border-ink">
                    <span
                      className="block h-full border border-l-0 border-ink"
                      style={{
                        width: `${(values[place] ?? 0) * 10}%`,
                        background: facetColour(facet),
                        borderWidth: values[place] ? undefined : 0,
                      }}
                    />
                  </span>
                </span>
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
