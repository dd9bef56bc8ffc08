import { Strip } from '@/app/_components/strip/strip';
import type { FacetView } from '@/lib/shared/facet';
import type { MaterialView } from '@/lib/shared/material-view';
import { smellInWords } from '@/lib/shared/strip-bands';

/** The large strip with its words, and beside it what a smeller wrote. */
export function StripTile({ material, facets }: { material: MaterialView; facets: readonly FacetView[] }) {
  const { profile, phases, lastsHours, smell, name } = material;
  const words = smellInWords(profile, facets, lastsHours);
  return (
    <section className="grid content-start gap-6 bg-paper px-6 pt-7 pb-8 md:px-8" aria-labelledby="smell">
      <div>
        <h2 id="smell" className="sr-only">
          What it smells like
        </h2>
        {smell ? <p className="latin text-title leading-[1.35] text-balance">{smell}</p> : null}
        <p className="mt-3 text-ink-soft first-letter:uppercase">{words}.</p>
      </div>
      <div className="pl-5">
        <Strip size="page" facets={facets} profile={profile} phases={phases} lastsHours={lastsHours} name={name} />
      </div>
    </section>
  );
}
