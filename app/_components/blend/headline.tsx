import type { ReactNode } from 'react';
import { percent, pointsOf, pricePerKg } from '@/lib/shared/blend-figures';

export interface HeadlineProps {
  distance: number;
  expectedDistance: number;
  /** Null for a drawn profile. */
  targetName: string | null;
  strengthOfTarget: number;
  natural: number;
  /** Null for a role that sees no prices. */
  money: { currency: string; costPerKg: number; costAtEqualStrength: number; targetCostPerKg: number | null } | null;
}

/** The answer in figures: how near, for how much, how strong, how natural. */
export function Headline({ distance, expectedDistance, targetName, strengthOfTarget, natural, money }: HeadlineProps) {
  const target = targetName ? 'the target' : 'linalool';
  return (
    <dl className="grid grid-cols-2 gap-x-6 gap-y-4 sm:grid-cols-3">
      <Figure term="Distance" value={pointsOf(distance)} big>
        points of the 0–10 scale; {pointsOf(expectedDistance)} with the spread between noses
      </Figure>
      {money ? (
        <>
          <Figure term="At equal strength" value={pricePerKg(money.costAtEqualStrength, money.currency)}>
            {money.targetCostPerKg === null ? 'as strong as linalool' : compared(money.costAtEqualStrength, money)}
          </Figure>
          <Figure term="Per kg, as it is" value={pricePerKg(money.costPerKg, money.currency)}>
            bought in packs
          </Figure>
        </>
      ) : null}
      <Figure term="Strength" value={percent(strengthOfTarget)}>
        of {target}’s
      </Figure>
      <Figure term="Natural" value={percent(natural)}>
        of its mass
      </Figure>
    </dl>
  );
}

function compared(cost: number, money: { targetCostPerKg: number | null; currency: string }): string {
  const target = money.targetCostPerKg ?? 0;
  return `target ${pricePerKg(target, money.currency)}: ${percent(cost / target)} of it`;
}

function Figure({ term, value, big, children }: { term: string; value: string; big?: boolean; children: ReactNode }) {
  return (
    <div className="min-w-24">
      <dt className="narrow text-ink-soft">{term}</dt>
      <dd className="grid">
        <span className={`figures whitespace-nowrap ${big ? 'text-title font-[600]' : 'text-lead font-[560]'}`}>
          {value}
        </span>
        <span className="max-w-48 text-note text-ink-soft">{children}</span>
      </dd>
    </div>
  );
}
