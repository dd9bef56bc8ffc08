'use client';

import { Button } from '@/app/_components/ui/button';
import { type Evidence, proposedEvaporation, proposedStrength } from '@/lib/shared/material-estimate';
import { estimateWords } from '@/lib/shared/number-words';
import { typedNumber } from '@/lib/shared/typed-number';
import type { MaterialDraft } from '../_client/material-draft';

interface EstimateOfferProps {
  draft: MaterialDraft;
  set: (change: Partial<MaterialDraft>) => void;
}

/** What the figures typed so far speak for, offered and never taken by itself. */
export function EstimateOffer({ draft, set }: EstimateOfferProps) {
  const known: Evidence = {
    vapourPressurePa: positive(draft.vapourPressurePa),
    odourThresholdUgPerM3: positive(draft.odourThresholdUgPerM3),
    strengthClass: draft.strengthClass,
  };
  const strength = proposedStrength(known);
  const evaporation = proposedEvaporation(known.vapourPressurePa);
  const both = known.vapourPressurePa !== null && known.odourThresholdUgPerM3 !== null;
  return (
    <div className="grid gap-3 md:col-span-full">
      {strength ? (
        <p className="flex flex-wrap items-center gap-3 text-note">
          <span>
            {both ? 'Vapour pressure and threshold speak for' : 'The strength in words speaks for'}{' '}
            {estimateWords(strength.strength)} per gram, within a factor of {estimateWords(strength.spread)}.
          </span>
          <Button
            size="small"
            onClick={() =>
              set({
                strength: String(strength.strength),
                strengthSpread: String(strength.spread),
                strengthSource: strength.source,
              })
            }
          >
            Take this strength
          </Button>
        </p>
      ) : null}
      {evaporation ? (
        <p className="flex flex-wrap items-center gap-3 text-note">
          <span>The vapour pressure speaks for {estimateWords(evaporation.perHour)} per hour from a blotter.</span>
          <Button
            size="small"
            onClick={() =>
              set({ evaporationPerHour: String(evaporation.perHour), evaporationSource: evaporation.source })
            }
          >
            Take this evaporation
          </Button>
        </p>
      ) : null}
    </div>
  );
}

/** Within what the engine takes for a measured figure; anything else is no evidence yet. */
function positive(typed: string): number | null {
  const read = typedNumber(typed);
  return 'value' in read && read.value !== null && read.value >= 1e-15 && read.value <= 1e9 ? read.value : null;
}
