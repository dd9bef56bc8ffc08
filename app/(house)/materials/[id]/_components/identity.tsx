import type { ReactNode } from 'react';
import { Facts, Tile } from '@/app/_components/ui/screen';
import { proposedStrength } from '@/lib/shared/material-estimate';
import type { MaterialView } from '@/lib/shared/material-view';
import { KIND_NAMES } from '@/lib/shared/material-words';
import { decimalWords, estimateWords, percentWords } from '@/lib/shared/number-words';

/** What it is: names, numbers, and what has been measured, each with where it is known from. */
export function Identity({ material: m }: { material: MaterialView }) {
  const facts: [string, ReactNode][] = [
    ['Kind', KIND_NAMES[m.kind]],
    ['Botanical name', m.botanicalName && <span className="latin">{m.botanicalName}</span>],
    ['Plant part', m.plantPart],
    ['Chemical name', m.chemicalName],
    ['INCI name', m.inciName],
    ['Also called', m.synonyms.length > 0 && m.synonyms.join('; ')],
    [m.cas.length > 1 ? 'CAS numbers' : 'CAS number', m.cas.length > 0 && m.cas.join(', ')],
    ['Natural share', percentWords(m.naturalShare)],
    [
      'Odour strength',
      <Sourced key="strength" source={m.strengthSource}>
        {m.strengthClass}, {estimateWords(m.strength)} per gram
        {m.strengthSpread > 1 ? `, within a factor of ${estimateWords(m.strengthSpread)}` : null}
      </Sourced>,
    ],
    [
      'Vapour pressure',
      m.vapourPressurePa !== null && measured(m.vapourPressurePa, 'Pa at 25 °C', m.vapourPressureSource),
    ],
    [
      'Odour threshold',
      m.odourThresholdUgPerM3 !== null && measured(m.odourThresholdUgPerM3, 'µg/m³', m.odourThresholdSource),
    ],
    ['Strength by these two', estimated(m)],
    ['Evaporation', m.evaporationPerHour !== null && measured(m.evaporationPerHour, 'per hour', m.evaporationSource)],
    ['Usual dilution', m.usualDilution && dilution(m.usualDilution, m.dilutionSolvent)],
    ['Largest share in a concentrate', m.maxShare && percentWords(m.maxShare)],
  ];
  return (
    <Tile title="What it is">
      <Facts facts={facts.flatMap(([term, value]) => (value ? [{ term, value }] : []))} />
      {m.parts && m.parts.length > 0 ? (
        <>
          <h3 className="mt-4">Made of</h3>
          <Facts facts={m.parts.map(({ name, share }) => ({ term: name, value: percentWords(share) }))} />
        </>
      ) : null}
      {m.note ? <p className="mt-4 max-w-prose whitespace-pre-wrap">{m.note}</p> : null}
    </Tile>
  );
}

/** Where vapour pressure and threshold are both known: what they speak for, beside what the house set. */
function estimated(m: MaterialView): ReactNode {
  if (m.vapourPressurePa === null || m.odourThresholdUgPerM3 === null) return null;
  const proposal = proposedStrength(m);
  return (
    proposal && (
      <Sourced source={proposal.source}>
        about {estimateWords(proposal.strength)} per gram, within a factor of {estimateWords(proposal.spread)}
      </Sourced>
    )
  );
}

const measured = (value: number, unit: string, source: string | null) => (
  <Sourced source={source}>
    {decimalWords(value, value < 0.01 ? 6 : 3)} {unit}
  </Sourced>
);

const dilution = (fraction: string, solvent: string | null) =>
  Number(fraction) === 1 ? 'as it is' : `${percentWords(fraction)} w/w${solvent ? ` in ${solvent}` : ''}`;

function Sourced({ source, children }: { source: string | null; children: ReactNode }) {
  return (
    <>
      {children}
      {source ? <span className="block text-note text-ink-soft">{source}</span> : null}
    </>
  );
}
