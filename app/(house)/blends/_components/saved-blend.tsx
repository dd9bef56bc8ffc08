import { Headline } from '@/app/_components/blend/headline';
import { LinesTable } from '@/app/_components/blend/lines-table';
import { Sentences } from '@/app/_components/blend/sentences';
import { Verdicts } from '@/app/_components/blend/verdicts';
import { ProfileBars } from '@/app/_components/charts/profile-bars';
import { Tile } from '@/app/_components/ui/screen';
import { percent, pricePerKg } from '@/lib/shared/blend-figures';
import type { SavedBlendView } from '@/lib/shared/blend-view';
import { WeighOut } from './weigh-out';

/** A saved blend as it was, what is otherwise today, and how to weigh it. */
export function SavedBlend({ blend }: { blend: SavedBlendView }) {
  const { solved, changes, request } = blend;
  const { facets, target, money, lines } = solved;
  return (
    <div className="tiles xl:grid-cols-[minmax(0,1.25fr)_minmax(0,1fr)]">
      <div className="grid grid-cols-[minmax(0,1fr)] content-start gap-6 py-5">
        <Changes changes={changes} />
        <div className="grid gap-5 px-5 md:px-6">
          <Headline
            distance={solved.distance ?? 0}
            expectedDistance={solved.expectedDistance ?? 0}
            targetName={target.materialId ? target.name : null}
            strengthOfTarget={solved.strengthOfTarget ?? 0}
            natural={solved.natural ?? 0}
            money={
              money && {
                currency: money.currency,
                costPerKg: Number(money.costPerKg),
                costAtEqualStrength: Number(money.costAtEqualStrength),
                targetCostPerKg: target.costPerKg ? Number(target.costPerKg) : null,
              }
            }
          />
          <p className="text-ink-soft">{askedInWords(blend)}</p>
          <Sentences heldBack={solved.heldBack} proof={solved.proof} cautions={solved.cautions} />
        </div>
        <LinesTable
          facets={facets}
          currency={money?.currency ?? null}
          lines={lines.map((line) => ({
            ...{ id: line.materialId, name: line.name, kind: line.kind, profile: line.profile, phases: line.phases },
            ...{ share: Number(line.share), impact: line.impact, isIncomplete: line.completeness !== 'full' },
            ...{ costPart: line.price ? Number(line.price.part) : null, offer: line.price?.offer },
          }))}
        />
      </div>
      <div className="grid grid-cols-[minmax(0,1fr)] content-start gap-px bg-grout">
        <Tile title="Weigh it out">
          <WeighOut
            lines={lines.map(({ materialId, name, share }) => ({ id: materialId, name, share: Number(share) }))}
          />
        </Tile>
        <Tile title="What is missing, what is too much">
          <ProfileBars
            facets={facets}
            target={target.profile}
            blend={solved.profile}
            targetName={target.name}
            most={16}
          />
        </Tile>
        <Tile title="Limits on that day">
          {request.product ? (
            <Verdicts verdicts={solved.verdicts} withoutFigure={solved.limitsWithoutFigure} />
          ) : (
            <p className="text-ink-soft">No product was named, so no limit was looked at.</p>
          )}
        </Tile>
      </div>
    </div>
  );
}

function Changes({ changes }: { changes: readonly string[] }) {
  if (changes.length === 0)
    return <p className="px-5 text-ink-soft md:px-6">Prices, materials and limits are today as they were then.</p>;
  return (
    <section className="mx-5 border border-ink p-4 md:mx-6">
      <h2 className="text-lead">Changed since</h2>
      <ul className="mt-2 grid list-disc gap-1 pl-5">
        {changes.map((change) => (
          <li key={change}>{change}</li>
        ))}
      </ul>
    </section>
  );
}

/** The rules it was solved under, in one sentence. */
function askedInWords({ request, solved }: SavedBlendView): string {
  const { product, minNatural, minStrength, ceiling, packGrams } = request;
  const currency = solved.money?.currency;
  const rules = [
    ceiling && currency
      ? `at most ${pricePerKg(Number(ceiling.amount), currency)}${ceiling.basis === 'per kg' ? '' : ' at equal strength'}`
      : null,
    minStrength ? `at least ${percent(minStrength)} as strong` : null,
    minNatural ? `at least ${percent(minNatural)} natural` : null,
    product ? `${product.concentratePct} % concentrate in product category ${product.category}` : null,
    currency ? `priced in packs of ${packGrams} g` : null,
  ].filter(Boolean);
  return rules.length > 0 ? `Asked for: ${rules.join('; ')}.` : 'Asked for without rules.';
}
