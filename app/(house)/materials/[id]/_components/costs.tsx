'use client';

import { useState } from 'react';
import { Choice } from '@/app/_components/ui/choice';
import { Facts, Tile } from '@/app/_components/ui/screen';
import { Table, Td, Th } from '@/app/_components/ui/table';
import type { MaterialView } from '@/lib/shared/material-view';
import { dayWords, moneyWords, packWords } from '@/lib/shared/number-words';
import { type Cost, materialCost, USUAL_PACK_GRAMS } from '@/lib/shared/price';
import { qualityName } from '../_client/quality-name';

const PACKS = ['10', '25', '100', '500', '1000'] as const;

/** What it costs: at a pack size that one chooses, and every pack that is offered. */
export function Costs({ material, currency }: { material: MaterialView; currency: string }) {
  const [pack, setPack] = useState<string>(USUAL_PACK_GRAMS);
  const qualities = material.qualities.map((quality, position) => ({
    ...quality,
    position,
    offers: quality.offers ?? [],
  }));
  const cost = materialCost({ strength: material.strength, qualities }, currency, pack);
  const bought = cost.purchase;
  return (
    <Tile title="What it costs">
      <Choice
        label="Bought for at least"
        value={pack}
        onChange={setPack}
        options={PACKS.map((grams) => ({ value: grams, label: packWords(grams, 'g') }))}
      />
      <dl className="mt-4 grid grid-cols-3 gap-x-4 border-y border-ink py-3">
        <Figure term="Per kg" cost={cost.perKg} currency={currency} />
        <Figure term="Per mL" cost={cost.perMl} currency={currency} />
        <Figure term="At equal strength" cost={cost.atEqualStrength} currency={currency} />
      </dl>
      <p className="mt-2 text-note text-ink-soft">
        {bought
          ? `${bought.packs === 1 ? 'One pack' : `${bought.packs} packs`} of ${packWords(bought.offer.packAmount, bought.offer.packUnit)}, ${moneyWords(bought.outlay.toFixed(), currency)} in all, of the preferred quality. `
          : null}
        At equal strength means per 1,000 units of odour impact. Shipping is not in it.
      </p>
      <div className="-mx-5 mt-4 md:-mx-6">
        {qualities.map((quality) =>
          quality.offers.length > 0 ? (
            <Table key={quality.id} label={`Offers of ${qualityName(quality)}`} className="mb-4">
              <caption className="narrow px-5 pb-1 text-left text-ink-soft">
                {qualityName(quality)}
                {quality.preferred && qualities.length > 1 ? ', preferred' : null}
              </caption>
              <thead>
                <tr>
                  <Th numeric className="text-left">
                    Pack
                  </Th>
                  <Th numeric>Price</Th>
                  <Th numeric>Per kg</Th>
                  <Th numeric>Per mL</Th>
                  <Th numeric>Equal strength</Th>
                  <Th>Offered</Th>
                </tr>
              </thead>
              <tbody>
                {quality.offers.map((offer) => (
                  <tr key={offer.id} className={offer.id === bought?.offer.id ? 'font-[600]' : undefined}>
                    <Td className="figures whitespace-nowrap">
                      {packWords(offer.packAmount, offer.packUnit)}
                      {offer.id === bought?.offer.id ? <span className="sr-only">, cheapest for this need</span> : null}
                    </Td>
                    <Td numeric>{moneyWords(offer.price, offer.currency)}</Td>
                    <CostCell cost={offer.costPerKg} currency={offer.currency} />
                    <CostCell cost={offer.costPerMl} currency={offer.currency} />
                    <CostCell cost={offer.costAtEqualStrength} currency={offer.currency} />
                    <Td className="whitespace-nowrap text-ink-soft">{dayWords(offer.offeredOn)}</Td>
                  </tr>
                ))}
              </tbody>
            </Table>
          ) : null,
        )}
      </div>
      {qualities.every(({ offers }) => offers.length === 0) ? (
        <Facts facts={[{ term: 'Offers', value: 'None is entered.' }]} />
      ) : null}
    </Tile>
  );
}

function Figure({ term, cost, currency }: { term: string; cost: Cost; currency: string }) {
  return (
    <div>
      <dt className="narrow text-ink-soft">{term}</dt>
      <dd className="figures text-title">
        {cost.value ? (
          moneyWords(cost.value.toFixed(4), currency)
        ) : (
          <span className="block text-data text-ink-soft">{cost.reason}</span>
        )}
      </dd>
    </div>
  );
}

function CostCell({ cost, currency }: { cost: { value: string | null; reason: string | null }; currency: string }) {
  return (
    <Td numeric>
      {cost.value ? (
        moneyWords(cost.value, currency)
      ) : (
        <>
          <span aria-hidden="true" title={cost.reason ?? undefined}>
            —
          </span>
          <span className="sr-only">{cost.reason}</span>
        </>
      )}
    </Td>
  );
}
