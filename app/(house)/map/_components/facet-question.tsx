'use client';

import { Button } from '@/app/_components/ui/button';
import { Combobox } from '@/app/_components/ui/combobox';
import type { RelatedMap } from '@/lib/shared/related';
import { PLAINLY } from '@/lib/shared/who-shares';
import { answerInWords } from '../_client/in-words';
import { useMapState } from '../_client/map-state';
import type { MapView } from '../_client/model';
import { FacetSwatch } from './facet-swatch';

const MOST_FACETS = 3;
const WORDS = ['Who smells of', 'and of', 'and of'];

/** The learner's question as a sentence, and its answer beneath it. */
export function FacetQuestion({ map, view }: { map: RelatedMap; view: MapView }) {
  const [{ smells }, setState] = useMapState();
  const items = map.facets.map(({ slug, name, family }) => ({ id: slug, label: name, detail: family }));
  const facetOf = new Map(map.facets.map((facet) => [facet.slug, facet]));
  const slots = Math.min(MOST_FACETS, Math.max(2, smells.length + 1));
  const put = (slot: number, slug: string | null) => {
    const next = [...smells];
    if (slug) next[slot] = slug;
    else next.splice(slot, 1);
    setState({ smells: next.filter((each, at) => each && next.indexOf(each) === at) });
  };
  return (
    <section
      aria-label="Who shares which facets"
      className="flex flex-wrap items-center gap-x-8 gap-y-3 border-t border-grout px-5 py-4 md:px-8"
    >
      <div className="grid w-full grid-cols-2 items-end gap-3 xs:flex xs:w-auto xs:flex-wrap">
        {Array.from({ length: slots }, (_, slot) => (
          <Combobox
            // biome-ignore lint/suspicious/noArrayIndexKey: a slot is its place in the sentence
            key={slot}
            label={WORDS[slot] ?? 'and of'}
            items={items.filter(({ id }) => id === smells[slot] || !smells.includes(id))}
            value={smells[slot] ?? null}
            onChange={(slug) => put(slot, slug)}
            placeholder={slot === 0 ? 'a facet' : slot === 1 ? 'another facet' : 'a third'}
            lead={(item) => <FacetSwatch facet={facetOf.get(item.id)} />}
            className="min-w-0 xs:w-48"
          />
        ))}
        {smells.length > 0 ? (
          <Button look="quiet" onClick={() => setState({ smells: [] })}>
            Clear
          </Button>
        ) : null}
      </div>
      <p className="min-w-[min(100%,24rem)] flex-1 text-body" data-answer>
        {view.chosen.length > 0
          ? answerInWords(view)
          : 'Pick one facet, or two: the map lights who shares them, and names what leads from one to the other.'}
        {view.chosen.length > 0 ? (
          <span className="text-ink-soft">
            {' '}
            Plainly means {PLAINLY} of 10 or more; in balance, the weaker at least half the stronger.
          </span>
        ) : null}
      </p>
    </section>
  );
}
