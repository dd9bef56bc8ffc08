import { Strip } from '../_components/strip/strip';
import { SAMPLE, type SampleMaterial, sampleProfile, shortName } from './sample';
import type { SampleAnswer } from './sample-answer';

const byKey = new Map(SAMPLE.candidates.map((material) => [material.key, material]));
const percent = new Intl.NumberFormat('en-GB', { maximumSignificantDigits: 2, style: 'percent' });
const euro = new Intl.NumberFormat('en-GB', { maximumSignificantDigits: 3, style: 'currency', currency: 'EUR' });

/** The blend, line by line: how much of the mass, how much of the smell, at what price. */
export function BlendLines({ lines }: { lines: SampleAnswer['lines'] }) {
  return (
    <table className="w-full border-collapse text-left">
      <caption className="sr-only">The blend, largest part of the smell first</caption>
      <thead>
        <tr className="narrow border-b border-ink text-ink-soft">
          <th scope="col" colSpan={2} className="h-8 font-normal">
            Material
          </th>
          <th scope="col" className="pl-3 text-right font-normal">
            of the mass
          </th>
          <th scope="col" className="pl-3 text-right font-normal">
            of the smell
          </th>
          <th scope="col" className="hidden pl-3 text-right font-normal sm:table-cell">
            EUR per kg
          </th>
        </tr>
      </thead>
      <tbody>
        {lines.map((line) => {
          const material = byKey.get(line.key);
          return material ? <Line key={line.key} line={line} material={material} /> : null;
        })}
      </tbody>
    </table>
  );
}

function Line({ line, material }: { line: SampleAnswer['lines'][number]; material: SampleMaterial }) {
  return (
    <tr className="border-b border-grout">
      <td className="w-7 py-1.5">
        <Strip size="table" decorative facets={SAMPLE.facets} profile={sampleProfile(material)} />
      </td>
      <th scope="row" className="font-normal">
        <span className="block font-[560]">{shortName(material)}</span>
        {material.latin ? <span className="latin block text-ink-soft">{material.latin}</span> : null}
      </th>
      <td className="figures pl-3 text-right">{percent.format(line.share)}</td>
      <td className="figures pl-3 text-right font-[560]">{percent.format(line.impact)}</td>
      <td className="figures hidden pl-3 text-right text-ink-soft sm:table-cell">
        {euro.format(material.costPerKg).replace('€', '')}
      </td>
    </tr>
  );
}
