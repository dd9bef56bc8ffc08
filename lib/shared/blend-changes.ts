import type { Candidate } from './blend-candidate';
import { percent, pricePerKg } from './blend-figures';
import { type LimitsInForce, type LimitVerdict, limitVerdicts } from './limit-verdict';

export interface Change {
  words: string;
  isAboutPrice: boolean;
}

export interface ThenLine {
  share: number;
  material: Candidate;
}

export interface Then {
  lines: readonly ThenLine[];
  verdicts: readonly LimitVerdict[];
  concentrate: number;
  currency: string;
}

/** `limits` is null where no product was named. */
export interface Now {
  candidates: ReadonlyMap<string, Candidate>;
  limits: LimitsInForce | null;
}

const notice = (words: string): Change => ({ words, isAboutPrice: false });
const price = (words: string): Change => ({ words, isAboutPrice: true });

/** What is otherwise today than on the day a blend was saved: prices, materials, ratings, composition, limits. */
export function changesSince(then: Then, now: Now): Change[] {
  return [
    ...totalChange(then, now),
    ...then.lines.flatMap((line) => lineChanges(line, now, then.currency)),
    ...limitChanges(then, now),
  ];
}

/** A change of price below this is rounding. */
const SAME_PRICE = 1e-9;

function totalChange({ lines, currency }: Then, { candidates }: Now): Change[] {
  const today = lines.map(({ share, material }) => {
    const cost = candidates.get(material.id)?.costPerKg;
    return cost ? share * Number(cost) : null;
  });
  if (today.includes(null)) return [];
  const sum = today.reduce<number>((total, part) => total + (part ?? 0), 0);
  const before = lines.reduce((total, { share, material }) => total + share * Number(material.costPerKg), 0);
  if (Math.abs(sum - before) <= SAME_PRICE * before) return [];
  const word = sum > before ? 'dearer' : 'cheaper';
  return [
    price(
      `The blend would be ${word} today: ${pricePerKg(sum, currency)} instead of ${pricePerKg(before, currency)} (${signedPercent(sum / before - 1)}).`,
    ),
  ];
}

function lineChanges({ material }: ThenLine, { candidates }: Now, currency: string): Change[] {
  const today = candidates.get(material.id);
  if (!today) return [notice(`${material.name} is not in the library any more.`)];
  const changes: Change[] = [];
  if (today.name !== material.name) changes.push(notice(`${material.name} is called ${today.name} today.`));
  const [before, after] = [Number(material.costPerKg), Number(today.costPerKg)];
  if (today.costPerKg === null)
    changes.push(price(`${material.name} has no price today. ${today.costReason ?? ''}`.trim()));
  else if (Math.abs(after - before) > SAME_PRICE * before)
    changes.push(
      price(
        `${material.name} is ${after > before ? 'dearer' : 'cheaper'}: ${pricePerKg(after, currency)} instead of ${pricePerKg(before, currency)} (${signedPercent(after / before - 1)}).`,
      ),
    );
  if (!sameVector(today.profile, material.profile) || today.strength !== material.strength)
    changes.push(
      notice(`${material.name} is rated otherwise today; the blend may smell nearer or further than it says.`),
    );
  if (today.completeness !== material.completeness || !sameComposition(today, material))
    changes.push(notice(`The composition of ${material.name} is stated otherwise today.`));
  return changes;
}

function limitChanges({ lines, verdicts, concentrate }: Then, { candidates, limits }: Now): Change[] {
  if (!limits) return [];
  const today = new Map(
    limitVerdicts(
      limits.applied,
      lines.map(({ share, material }) => ({ share, material: candidates.get(material.id) ?? material })),
      concentrate,
    ).map((verdict) => [verdict.limit.id, verdict]),
  );
  const known = new Set(verdicts.map(({ limit }) => limit.id));
  const changes = verdicts.flatMap((before) => {
    const after = today.get(before.limit.id);
    const name = `The limit on ${before.limit.name} (${before.limit.setTitle})`;
    if (!after) return [notice(`${name} is not in force any more.`)];
    const figure =
      after.limit.maxFraction === before.limit.maxFraction
        ? []
        : [
            notice(
              `${name} is ${percent(after.limit.maxFraction)} in the product today instead of ${percent(before.limit.maxFraction)}.`,
            ),
          ];
    return after.verdict === before.verdict
      ? figure
      : [...figure, notice(`${name} would be ${after.verdict} today; it was ${before.verdict}.`)];
  });
  for (const [id, { limit, verdict }] of today)
    if (!known.has(id)) changes.push(notice(`There is a new limit on ${limit.name} (${limit.setTitle}): ${verdict}.`));
  return changes;
}

const signedPercent = (part: number): string => `${part > 0 ? '+' : '−'}${percent(Math.abs(part))}`;

const sameVector = (a: readonly number[], b: readonly number[]): boolean =>
  a.length === b.length && a.every((value, index) => value === b[index]);

/** Order and constituents that hold nothing don't count. */
function sameComposition(a: Pick<Candidate, 'constituents'>, b: Pick<Candidate, 'constituents'>): boolean {
  const text = ({ constituents }: Pick<Candidate, 'constituents'>) =>
    constituents
      .map(({ id, max, typical }) => `${id} ${max} ${typical}`)
      .sort()
      .join('\n');
  return text(a) === text(b);
}
