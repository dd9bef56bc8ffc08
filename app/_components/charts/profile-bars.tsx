import type { FacetTone } from '@/lib/shared/facet';
import { facetColour } from '@/lib/shared/facet-colour';
import { DRAWN_FROM, type ProfileRow, profileRows } from './profile-rows';

export interface ProfileBarsProps {
  facets: readonly FacetTone[];
  /** Intensities 0..10, in the order of `facets`. */
  target: ArrayLike<number>;
  blend: ArrayLike<number>;
  targetName?: string;
  blendName?: string;
  /** At most so many rows: those most missing, then those most in excess. */
  most?: number;
  caption?: string;
}

const points = new Intl.NumberFormat('en-GB', { minimumFractionDigits: 1, maximumFractionDigits: 1 });
const signed = new Intl.NumberFormat('en-GB', {
  minimumFractionDigits: 1,
  maximumFractionDigits: 1,
  signDisplay: 'exceptZero',
});

/**
 * Two profiles as paired bars: the target an empty outline, the blend filled, sorted by what is missing, the
 * difference at the end. It is a table with bars in it, so it needs no twin.
 */
export function ProfileBars(props: ProfileBarsProps) {
  const { facets, target, blend, targetName = 'Target', blendName = 'Blend', most, caption } = props;
  const rows = shorten(profileRows(facets, target, blend), most);
  return (
    <table className="w-full border-collapse">
      <caption className="sr-only">
        {caption ?? `${targetName} and ${blendName}, facet by facet, on a scale from 0 to 10`}
      </caption>
      <thead>
        <tr className="narrow text-ink-soft">
          <th scope="col" className="w-[1%] pb-1 text-left font-normal whitespace-nowrap">
            Facet
          </th>
          <th scope="col" className="pb-1 pl-3 text-left font-normal">
            <Key targetName={targetName} blendName={blendName} />
          </th>
          <th scope="col" className="w-[1%] pb-1 pl-3 text-right font-normal whitespace-nowrap">
            blend − target
          </th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <Row key={row.facet.id} row={row} targetName={targetName} blendName={blendName} />
        ))}
      </tbody>
    </table>
  );
}

function Row({ row, targetName, blendName }: { row: ProfileRow; targetName: string; blendName: string }) {
  const { facet, target, blend, missing } = row;
  return (
    <tr className="border-t border-grout">
      <th scope="row" className="py-1.5 text-left font-normal whitespace-nowrap">
        {facet.name}
      </th>
      <td className="pl-3">
        <span className="sr-only">
          {targetName} {points.format(target)}, {blendName} {points.format(blend)}
        </span>
        <Bars row={row} />
      </td>
      <td
        className={`figures pl-3 text-right whitespace-nowrap ${Math.abs(missing) >= 0.5 ? 'font-[650]' : 'text-ink-soft'}`}
      >
        {signed.format(-missing).replace('-', '−')}
      </td>
    </tr>
  );
}

/** Both on the same 0..10 length, graduated every 2. */
function Bars({ row }: { row: ProfileRow }) {
  return (
    <span aria-hidden="true" className="relative block h-5">
      {[2, 4, 6, 8].map((mark) => (
        <span key={mark} className="absolute inset-y-0 w-px bg-grout" style={{ left: `${mark * 10}%` }} />
      ))}
      {row.target >= DRAWN_FROM ? (
        <span
          className="absolute top-0 left-0 h-[10px] border border-ink bg-paper"
          style={{ width: length(row.target) }}
        />
      ) : null}
      {row.blend >= DRAWN_FROM ? (
        <span
          className="absolute bottom-0 left-0 h-[11px] border border-ink transition-[width] duration-150"
          style={{ width: length(row.blend), background: facetColour(row.facet) }}
        />
      ) : null}
      <span className="absolute inset-y-0 left-0 w-px bg-ink" />
    </span>
  );
}

const length = (intensity: number) => `${Math.min(10, intensity) * 10}%`;

function Key({ targetName, blendName }: { targetName: string; blendName: string }) {
  return (
    <span className="flex flex-wrap gap-x-4">
      <span className="inline-flex items-center gap-1.5">
        <span aria-hidden="true" className="h-2.5 w-5 border border-ink bg-paper" />
        {targetName}
      </span>
      <span className="inline-flex items-center gap-1.5">
        <span aria-hidden="true" className="h-2.5 w-5 border border-ink bg-ink-faint" />
        {blendName}
      </span>
    </span>
  );
}

/** Keeps both ends of the order: what is most missing and what is most in excess. */
function shorten(rows: ProfileRow[], most = rows.length): ProfileRow[] {
  if (rows.length <= most) return rows;
  const weighty = rows.toSorted((a, b) => Math.abs(b.missing) - Math.abs(a.missing)).slice(0, most);
  return rows.filter((row) => weighty.includes(row));
}
