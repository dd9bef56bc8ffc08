import { Strip } from '../_components/strip/strip';
import { SAMPLE, sampleProfile } from './sample';

const SHOWN = [
  'geranium-oil',
  'beeswax-absolute',
  'rose-oxide',
  'black-tea-absolute',
  'cis-3-hexenol',
  'clove-bud-oil',
  'mimosa-absolute',
  'alpha-damascone',
];

/** How far each stands in its holder, in parts of the screen's height. */
const SUNK = [16, 8, 24, 2, 19, 11, 27, 14];

/** Strips of the sample library as they stand in a holder, some drawn out a little. Decoration: it says nothing. */
export function StripRow() {
  const materials = SHOWN.flatMap((key) => SAMPLE.candidates.filter((material) => material.key === key));
  return (
    <div className="flex h-full items-end gap-[3dvh] overflow-hidden">
      {materials.map((material, index) => (
        <div key={material.key} className="flex-none" style={{ marginBottom: `-${SUNK[index % SUNK.length]}dvh` }}>
          <Strip
            size="page"
            labels={false}
            decorative
            facets={SAMPLE.facets}
            profile={sampleProfile(material)}
            className="h-[72dvh] w-auto"
          />
        </div>
      ))}
    </div>
  );
}
