import Link from 'next/link';
import type { ReactNode } from 'react';
import { ButtonLink } from '@/app/_components/ui/button';
import { Tag } from '@/app/_components/ui/mark';
import { Tile } from '@/app/_components/ui/screen';
import { EmptyState } from '@/app/_components/ui/states';
import { Table, Td, Th } from '@/app/_components/ui/table';
import type { MaterialView, QualityView } from '@/lib/shared/material-view';
import { COMPLETENESS_WORDS } from '@/lib/shared/material-words';
import { decimalWords, moneyWords } from '@/lib/shared/number-words';
import { may, type Role } from '@/lib/shared/permissions';
import { bestPurchase, USUAL_PACK_GRAMS } from '@/lib/shared/price';
import { qualityName } from '../_client/quality-name';

interface QualitiesProps {
  material: MaterialView;
  mayWrite: boolean;
  roles: readonly Role[];
}

/** The qualities side by side: unlike ones can share a name and a CAS number. */
export function Qualities({ material, mayWrite, roles }: QualitiesProps) {
  const { qualities, currency } = material;
  const mayEdit = mayWrite || may(roles, 'price.write') || may(roles, 'constituent.write');
  const add = (
    <ButtonLink size="small" href={`/materials/${material.id}/qualities/new`}>
      Add a quality
    </ButtonLink>
  );
  if (qualities.length === 0)
    return (
      <Tile title="Qualities" flush>
        <EmptyState title="No quality yet" action={mayWrite ? add : null}>
          A quality is one supplier’s grade: it carries composition, density, form and offers.
        </EmptyState>
      </Tile>
    );
  const rows: [string, (quality: QualityView) => ReactNode][] = [
    ['Origin', ({ origin }) => origin],
    ['Form', ({ form, warmToC }) => (warmToC ? `${form}, warm to ${decimalWords(warmToC)} °C` : form)],
    ['Density', ({ densityGPerMl }) => densityGPerMl && `${decimalWords(densityGPerMl)} g/mL`],
    ['Flash point', ({ flashPointC }) => flashPointC && `${decimalWords(flashPointC)} °C`],
    ['Colour', ({ colour }) => colour],
    ['Composition', ({ completeness }) => COMPLETENESS_WORDS[completeness].short],
    ['Constituents stated', ({ constituents }) => constituents.length],
  ];
  if (currency) rows.push([`Per kg, bought for ${USUAL_PACK_GRAMS} g`, (quality) => costOf(quality, currency)]);
  return (
    <Tile title="Qualities" actions={mayWrite ? add : null} flush>
      <Table label="Qualities compared" className="mt-2">
        <thead>
          <tr>
            <Th>
              <span className="sr-only">Property</span>
            </Th>
            {qualities.map((quality) => (
              <Th key={quality.id} className="py-2 align-bottom whitespace-normal text-ink">
                <span className="flex flex-wrap items-center gap-2">
                  {qualityName(quality)}
                  {quality.preferred && qualities.length > 1 ? <Tag>preferred</Tag> : null}
                  {mayEdit ? (
                    <Link
                      href={`/materials/${material.id}/qualities/${quality.id}`}
                      className="font-normal underline decoration-rule underline-offset-4"
                    >
                      Edit<span className="sr-only"> {qualityName(quality)}</span>
                    </Link>
                  ) : null}
                </span>
              </Th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map(([name, value]) => (
            <tr key={name}>
              <th scope="row" className="h-10 border-b border-grout pr-3 pl-5 text-left font-normal text-ink-soft">
                {name}
              </th>
              {qualities.map((quality) => (
                <Td key={quality.id} className="figures h-10">
                  {value(quality) || <span className="text-ink-soft">not known</span>}
                </Td>
              ))}
            </tr>
          ))}
        </tbody>
      </Table>
    </Tile>
  );
}

function costOf(quality: QualityView, currency: string): string | null {
  const bought = bestPurchase(quality.offers ?? [], quality.densityGPerMl, USUAL_PACK_GRAMS, currency);
  return bought && moneyWords(bought.costPerKg.toFixed(4), currency);
}
