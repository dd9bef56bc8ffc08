import Link from 'next/link';
import type { ReactNode } from 'react';
import { impactInColumn, shareInColumn } from '@/lib/shared/blend-figures';
import type { FacetTone } from '@/lib/shared/facet';
import type { Phase } from '../strip/segments';
import { Strip } from '../strip/strip';
import { Table, Td, Th } from '../ui/table';

export interface BlendLineShown {
  id: string;
  name: string;
  kind: string;
  profile: readonly number[];
  phases: Partial<Record<Phase, readonly number[]>>;
  share: number;
  impact: number;
  isIncomplete: boolean;
  /** What it adds to the price of a kilogram; null for a role that sees no prices. */
  costPart: number | null;
  /** The offer behind the price, where it is shown. */
  offer?: string | null;
}

interface LinesTableProps {
  facets: readonly FacetTone[];
  lines: readonly BlendLineShown[];
  /** Null for a role that sees no prices. */
  currency: string | null;
  /** What can be done with a line. */
  actionsOf?: (line: BlendLineShown) => ReactNode;
}

const money = new Intl.NumberFormat('en-GB', { minimumFractionDigits: 2, maximumFractionDigits: 2 });

/** The blend, line by line: how much of the mass, how much of the smell, how much of the price. */
export function LinesTable({ facets, lines, currency, actionsOf }: LinesTableProps) {
  const total = lines.reduce((sum, { costPart }) => sum + (costPart ?? 0), 0);
  return (
    <Table label="The blend, line by line">
      <thead>
        <tr>
          <Th>Material</Th>
          <Th numeric>Mass, %</Th>
          <Th>
            <span className="max-sm:hidden">Of the s</span>
            <span className="sm:hidden">S</span>mell, %
          </Th>
          {currency ? (
            <Th numeric className="max-sm:hidden">
              {currency} in 1 kg
            </Th>
          ) : null}
          {actionsOf ? (
            <Th>
              <span className="sr-only">Rules for it</span>
            </Th>
          ) : null}
        </tr>
      </thead>
      <tbody>
        {lines.map((line) => (
          <tr key={line.id} className="group">
            <Td>
              <span className="flex items-center gap-3">
                <Strip size="table" facets={facets} profile={line.profile} phases={line.phases} decorative />
                <span className="min-w-0">
                  <Link href={`/materials/${line.id}`} className="block leading-tight hover:underline">
                    {line.name}
                  </Link>
                  <span className="block text-note text-ink-soft">
                    {line.kind}
                    {line.isIncomplete ? ' · composition incomplete' : ''}
                    {line.offer ? ` · ${line.offer}` : ''}
                  </span>
                </span>
              </span>
            </Td>
            <Td numeric>{shareInColumn(line.share)}</Td>
            <Td>
              <ImpactBar impact={line.impact} />
            </Td>
            {currency ? (
              <Td numeric className="max-sm:hidden">
                {line.costPart === null ? '' : money.format(line.costPart)}
              </Td>
            ) : null}
            {actionsOf ? <Td className="w-[1%] whitespace-nowrap">{actionsOf(line)}</Td> : null}
          </tr>
        ))}
      </tbody>
      <tfoot>
        <tr className="font-[560]">
          <Td className="border-b-0">
            {lines.length} {lines.length === 1 ? 'material' : 'materials'}
          </Td>
          <Td numeric className="border-b-0">
            100.00
          </Td>
          <Td className="border-b-0" />
          {currency ? (
            <Td numeric className="border-b-0 max-sm:hidden">
              {money.format(total)}
            </Td>
          ) : null}
          {actionsOf ? <Td className="border-b-0" /> : null}
        </tr>
      </tfoot>
    </Table>
  );
}

function ImpactBar({ impact }: { impact: number }) {
  return (
    <span className="flex items-center justify-end gap-2 sm:min-w-24">
      <span aria-hidden="true" className="h-2 flex-1 border-l border-ink max-sm:hidden">
        <span className="block h-full bg-ink" style={{ width: `${Math.min(1, impact) * 100}%` }} />
      </span>
      <span className="figures w-9 text-right">{impactInColumn(impact)}</span>
    </span>
  );
}
