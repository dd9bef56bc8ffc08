import { Tile } from '@/app/_components/ui/screen';
import type { MaterialView, QualityView } from '@/lib/shared/material-view';
import { COMPLETENESS_WORDS } from '@/lib/shared/material-words';
import { percentWords } from '@/lib/shared/number-words';
import { qualityName } from '../_client/quality-name';

/** What the preferred quality contains, and below it the others: ranges, and how much of the truth they are. */
export function Contains({ material, mayRead }: { material: MaterialView; mayRead: boolean }) {
  const [first, ...others] = material.qualities;
  return (
    <Tile title="What it contains">
      {!mayRead ? (
        <p className="text-ink-soft">Your role does not show compositions.</p>
      ) : first ? (
        <>
          <Composition quality={first} />
          {others.map((quality) => (
            <details key={quality.id} className="group mt-4 border-t border-grout pt-3">
              <summary className="list-none font-[560] hover:underline">
                <span aria-hidden="true" className="inline-block w-4 transition-transform group-open:rotate-90">
                  ›
                </span>
                {qualityName(quality)}: {COMPLETENESS_WORDS[quality.completeness].short}
              </summary>
              <div className="pt-3">
                <Composition quality={quality} />
              </div>
            </details>
          ))}
        </>
      ) : (
        <p className="text-ink-soft">
          No quality is entered, so nothing is known of what it contains, and no limit counts as met with it.
        </p>
      )}
    </Tile>
  );
}

function Composition({ quality }: { quality: QualityView }) {
  const words = COMPLETENESS_WORDS[quality.completeness];
  return (
    <>
      <p className="max-w-prose">{words.long}</p>
      <p className="mt-1 mb-3 text-note text-ink-soft">
        {qualityName(quality)}
        {quality.compositionSource ? `; ${quality.compositionSource}` : null}
      </p>
      {quality.constituents.length > 0 ? <Ranges quality={quality} /> : null}
    </>
  );
}

const LOWEST_PERCENT = 0.01;
/** On a logarithmic length from 0.01 % to 100 %: traces matter here. */
const along = (fraction: string) => {
  const percent = Math.max(LOWEST_PERCENT, Number(fraction) * 100);
  return (Math.log10(percent / LOWEST_PERCENT) / 4) * 100;
};

function Ranges({ quality }: { quality: QualityView }) {
  return (
    <table className="w-full border-collapse">
      <caption className="sr-only">Constituents with their range in per cent by mass, the largest first</caption>
      <thead>
        <tr className="narrow text-left text-ink-soft">
          <th scope="col" className="pb-1 font-normal">
            Constituent
          </th>
          <th scope="col" className="w-[32%] pb-1 pl-4 font-normal max-sm:hidden">
            <span aria-hidden="true" className="flex justify-between">
              <span>0.01</span>
              <span>0.1</span>
              <span>1</span>
              <span>10</span>
              <span>100 %</span>
            </span>
            <span className="sr-only">Range, drawn</span>
          </th>
          <th scope="col" className="pb-1 pl-4 text-right font-normal whitespace-nowrap">
            least – most
          </th>
          <th scope="col" className="pb-1 pl-4 text-right font-normal">
            typical
          </th>
        </tr>
      </thead>
      <tbody>
        {quality.constituents.map(
          ({ constituentId, name, cas, minFraction: min, typicalFraction: typical, ...range }) => (
            <tr key={constituentId} className="border-t border-grout" title={range.source}>
              <th scope="row" className="py-1.5 text-left font-normal">
                {name} {cas ? <span className="figures text-note whitespace-nowrap text-ink-soft">{cas}</span> : null}
                {range.source ? <span className="sr-only">, after {range.source}</span> : null}
              </th>
              <td className="pl-4 max-sm:hidden">
                <span aria-hidden="true" className="relative block h-4">
                  <span className="absolute inset-x-0 top-1/2 h-px bg-grout" />
                  <span
                    className="absolute top-1/2 h-[7px] min-w-[2px] -translate-y-1/2 border border-ink bg-pressed"
                    style={{ left: `${along(min)}%`, width: `${along(range.maxFraction) - along(min)}%` }}
                  />
                  {typical ? (
                    <span className="absolute inset-y-0 w-0.5 bg-ink" style={{ left: `${along(typical)}%` }} />
                  ) : null}
                </span>
              </td>
              <td className="figures pl-4 text-right whitespace-nowrap">
                {percentWords(min).replace(' %', '')} – {percentWords(range.maxFraction)}
              </td>
              <td className="figures pl-4 text-right whitespace-nowrap text-ink-soft">
                {typical ? percentWords(typical) : '—'}
              </td>
            </tr>
          ),
        )}
      </tbody>
    </table>
  );
}
