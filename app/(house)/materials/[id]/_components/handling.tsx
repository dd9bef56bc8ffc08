import { Facts, Tile } from '@/app/_components/ui/screen';
import type { MaterialView } from '@/lib/shared/material-view';
import { CAUTION_CODES, CAUTIONS } from '@/lib/shared/material-words';
import { decimalWords } from '@/lib/shared/number-words';

/** How to handle it. General words of common practice; the supplier's SDS, local rules and qualified people decide. */
export function Handling({ material }: { material: MaterialView }) {
  const [quality] = material.qualities;
  const cautions = material.cautions.toSorted((a, b) => CAUTION_CODES.indexOf(a.code) - CAUTION_CODES.indexOf(b.code));
  const facts = [
    { term: 'Form', value: quality?.form },
    {
      term: 'Warm before pouring',
      value: quality?.warmToC && `to ${decimalWords(quality.warmToC)} °C at most, closed, in a water bath`,
    },
    { term: 'Flash point', value: quality?.flashPointC && `${decimalWords(quality.flashPointC)} °C` },
    { term: 'Density', value: quality?.densityGPerMl && `${decimalWords(quality.densityGPerMl)} g/mL` },
    { term: 'Colour', value: quality?.colour },
  ];
  return (
    <Tile title="How to handle it">
      {cautions.length > 0 ? (
        <ul className="mb-4 grid gap-3">
          {cautions.map(({ code, source }) => (
            <li key={code} className="border-l-2 border-ink pl-3">
              <p className="font-[600]">{CAUTIONS[code].title}</p>
              <p>{CAUTIONS[code].advice}</p>
              <p className="text-note text-ink-soft">{source}</p>
            </li>
          ))}
        </ul>
      ) : (
        <p className="mb-4">No caution is entered. That is not the same as harmless: look in the SDS.</p>
      )}
      <Facts facts={facts.flatMap(({ term, value }) => (value ? [{ term, value }] : []))} />
      <p className="mt-4 max-w-prose text-ink-soft">
        These are reminders. The supplier’s safety data sheet, local rules and qualified people come first. Do not
        handle what you have no SDS for, and keep concentrates off the skin.
      </p>
    </Tile>
  );
}
