'use client';

import { Strip } from '@/app/_components/strip/strip';
import { Button, ButtonLink } from '@/app/_components/ui/button';
import { Tag } from '@/app/_components/ui/mark';
import type { RelatedMap } from '@/lib/shared/related';
import { smellInWords } from '@/lib/shared/strip-bands';
import { useMapState } from '../_client/map-state';
import type { MapMaterial, MapView } from '../_client/model';

interface MaterialPanelProps {
  material: MapMaterial;
  map: RelatedMap;
  view: MapView;
  mayBlend: boolean;
  onSelect: (id: string | null) => void;
}

/** The side sheet: what was picked on the map, and where to go from it. */
export function MaterialPanel({ material, map, view, mayBlend, onSelect }: MaterialPanelProps) {
  const [{ focus }, setState] = useMapState();
  const focused = focus === material.id;
  const hidden = !view.byId.has(material.id);
  return (
    <section aria-labelledby="picked" className="grid gap-4 md:border-b md:border-grout md:p-5">
      <div className="flex gap-4">
        <Strip size="line" facets={map.facets} profile={material.profile} phases={material.phases} decorative />
        <div className="min-w-0 flex-1">
          <h2 id="picked" className="text-lead wrap-anywhere">
            {material.name}
          </h2>
          {material.botanicalName ? <p className="latin text-ink-soft">{material.botanicalName}</p> : null}
          <p className="mt-1">
            <Tag>{material.kind}</Tag> <Tag>{naturalInWords(material.natural)}</Tag>
          </p>
        </div>
        <button
          type="button"
          aria-label={`Put ${material.name} away`}
          onClick={() => onSelect(null)}
          className="hidden size-8 flex-none place-items-center rounded-tile hover:bg-wash md:grid"
        >
          <svg viewBox="0 0 12 12" width="12" height="12" aria-hidden="true">
            <path d="m1 1 10 10M11 1 1 11" stroke="currentColor" strokeWidth="1.4" />
          </svg>
        </button>
      </div>
      <p>
        <span className="latin block">{material.smell}</span>
        <span className="mt-1 block text-ink-soft">{sentence(smellInWords(material.profile, map.facets))}.</span>
      </p>
      {hidden ? <p className="text-ink-soft">The filters leave it out of the map just now.</p> : null}
      <div className="flex flex-wrap gap-2">
        <ButtonLink size="small" look="solid" href={`/materials/${material.id}`}>
          Open the material
        </ButtonLink>
        {mayBlend ? (
          <ButtonLink size="small" href={`/blend?target=${material.id}`}>
            Use as target
          </ButtonLink>
        ) : null}
        <Button size="small" aria-pressed={focused} onClick={() => setState({ focus: focused ? null : material.id })}>
          {focused ? 'Back to the whole map' : 'Only it and its kin'}
        </Button>
      </div>
    </section>
  );
}

const sentence = (words: string) => words.charAt(0).toUpperCase() + words.slice(1);

function naturalInWords(share: number): string {
  if (share >= 1) return 'natural';
  return share <= 0 ? 'synthetic' : `${Math.round(share * 100)} % natural`;
}
