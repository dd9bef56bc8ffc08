import Link from 'next/link';
import type { CSSProperties } from 'react';
import { Strip } from '@/app/_components/strip/strip';
import { classNames } from '@/app/_components/ui/class-names';
import type { FacetView } from '@/lib/shared/facet';
import type { MaterialRow } from '@/lib/shared/material';
import { KIND_NAMES } from '@/lib/shared/material-words';
import { estimateWords, moneyWords, percentWords } from '@/lib/shared/number-words';
import { smellInWords } from '@/lib/shared/strip-bands';

/** The columns of heads and rows alike; those without prices have two fewer. */
export const GRID = (currency: string | null): string =>
  classNames(
    'grid items-center gap-x-4 px-5 md:px-8',
    currency
      ? 'grid-cols-[11px_minmax(0,1fr)_6rem] md:grid-cols-[11px_minmax(0,1fr)_5rem_7rem_7rem] lg:grid-cols-[11px_minmax(0,5fr)_minmax(0,5fr)_5rem_7rem_7rem] xl:grid-cols-[11px_minmax(0,5fr)_minmax(0,5fr)_5rem_5rem_7rem_7.5rem]'
      : 'grid-cols-[11px_minmax(0,1fr)] md:grid-cols-[11px_minmax(0,1fr)_6rem] lg:grid-cols-[11px_minmax(0,5fr)_minmax(0,6fr)_6rem] xl:grid-cols-[11px_minmax(0,5fr)_minmax(0,6fr)_6rem_6rem]',
  );

interface MaterialLineProps {
  row: MaterialRow;
  index: number;
  facets: readonly FacetView[];
  currency: string | null;
  style: CSSProperties;
}

export function MaterialLine({ row, index, facets, currency, style }: MaterialLineProps) {
  const smell = smellInWords(row.profile, facets, row.lastsHours);
  return (
    <tr
      aria-rowindex={index + 2}
      data-row={index}
      className={classNames(
        GRID(currency),
        'absolute inset-x-0 top-0 border-b border-grout hover:bg-wash has-[a:focus-visible]:bg-wash',
      )}
      style={style}
    >
      <td className="h-10">
        <Strip size="table" facets={facets} profile={row.profile} phases={row.phases} name={row.name} decorative />
      </td>
      <th scope="row" className="min-w-0 text-left font-normal">
        <Link
          href={`/materials/${row.id}`}
          prefetch={false}
          className="block truncate py-0.5 text-body font-[560] before:absolute before:inset-0 md:text-data"
        >
          {row.name}
        </Link>
        <p className="truncate text-note text-ink-soft">
          {row.botanicalName ? <span className="latin text-data">{row.botanicalName}</span> : KIND_NAMES[row.kind]}
          <span className="sr-only lg:hidden"> {smell}</span>
        </p>
      </th>
      <td className="truncate text-ink-soft max-lg:hidden">{smell.replace(/^mostly /, '')}</td>
      <td className="figures text-right max-xl:hidden">{percentWords(row.naturalShare)}</td>
      <td className="figures text-right max-md:hidden" title={row.strengthClass}>
        {estimateWords(row.strength)}
      </td>
      {currency ? <CostCell cost={row.costPerKg} currency={currency} /> : null}
      {currency ? <CostCell cost={row.costAtEqualStrength} currency={currency} className="max-md:hidden" /> : null}
    </tr>
  );
}

function CostCell({
  cost,
  currency,
  className,
}: {
  cost: MaterialRow['costPerKg'];
  currency: string;
  className?: string;
}) {
  return (
    <td className={classNames('figures text-right', className)}>
      {cost?.value ? (
        moneyWords(cost.value, currency)
      ) : (
        <span className="text-ink-soft" title={cost?.reason ?? undefined}>
          <span aria-hidden="true">—</span>
          <span className="sr-only">Not known. {cost?.reason}</span>
        </span>
      )}
    </td>
  );
}
