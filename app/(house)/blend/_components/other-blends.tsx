import { Button } from '@/app/_components/ui/button';
import { Tile } from '@/app/_components/ui/screen';
import type { BlendAnswer } from '@/lib/shared/blend-answer';
import { listed, pointsOf, pricePerKg } from '@/lib/shared/blend-figures';
import type { BlendRequest } from '@/lib/shared/blend-input';
import type { OtherBlend } from '../_client/messages';
import { useOthers } from '../_client/use-others';
import type { BenchParts } from './parts';

interface OtherBlendsProps extends Pick<BenchParts, 'inputs' | 'byId' | 'currency' | 'onChange'> {
  request: BlendRequest;
  answer: BlendAnswer;
}

/** Nearly as close, and built from other materials: for a day when one of them has run out. */
export function OtherBlends({ inputs, byId, currency, request, answer, onChange }: OtherBlendsProps) {
  const { blends, isSearching, search, stop } = useOthers(inputs, request);
  const nameOf = (id: string) => byId.get(id)?.name ?? id;
  return (
    <Tile title="Other good blends" className="xl:col-span-2">
      <p className="max-w-prose pb-3 text-ink-soft">
        Each does without at least one material that matters in every blend before it.
      </p>
      {isSearching ? (
        <p role="status" className="flex items-center gap-3">
          Looking for other blends
          <Button size="small" onClick={stop}>
            Stop
          </Button>
        </p>
      ) : blends === null ? (
        <Button onClick={search}>Look for other blends</Button>
      ) : blends.length === 0 ? (
        <p>No other blend keeps these rules.</p>
      ) : (
        <ul className="grid">
          {blends.map((blend, index) => {
            const { without, instead } = compared(answer, blends.slice(0, index), blend);
            return (
              <li
                key={blend.lines.map(({ id }) => id).join()}
                className="grid gap-x-6 gap-y-1 border-t border-grout py-3 md:grid-cols-[9rem_9rem_1fr_auto]"
              >
                <span className="figures">{pointsOf(blend.distance)} points away</span>
                <span className="figures">{pricePerKg(blend.costPerKg, currency)}</span>
                <span>
                  Without {listed(without.map(nameOf))}
                  {instead.length > 0 ? `; with ${listed(instead.slice(0, 4).map(nameOf))}` : ''}
                </span>
                <Button
                  size="small"
                  className="justify-self-start"
                  onClick={() => onChange({ ...request, excluded: [...new Set([...request.excluded, ...without])] })}
                >
                  Go on with this one
                </Button>
              </li>
            );
          })}
        </ul>
      )}
    </Tile>
  );
}

/** A line that does this much of the smell makes a blend what it is. */
const MATTERS = 0.05;

/** Which materials that matter in the blends before it it does without, and what it takes that this one does not. */
function compared(answer: BlendAnswer, before: readonly OtherBlend[], other: OtherBlend) {
  const its = new Set(other.lines.map(({ id }) => id));
  const ours = answer.lines.map(({ material, impact }) => ({ id: material.id, impact }));
  const earlier = [ours, ...before.map(({ lines }) => lines)].flat().filter(({ impact }) => impact >= MATTERS);
  return {
    without: [...new Set(earlier.map(({ id }) => id))].filter((id) => !its.has(id)),
    instead: other.lines
      .toSorted((a, b) => b.impact - a.impact)
      .flatMap(({ id }) => (ours.some((line) => line.id === id) ? [] : [id])),
  };
}
