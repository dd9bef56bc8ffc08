import 'server-only';
import { offers, qualities, qualityConstituents, suppliers } from '@/db/schema';
import type { Transaction } from '@/db/transaction';
import { newId } from '@/lib/id';
import { insertRows } from './batches';
import type { DemoLibrary } from './demo-files';
import type { DemoQuality } from './demo-format';
import { fractionOfPercent, sourceLine } from './library-text';
import { type IdByKey, newIds } from './load-words';

interface House {
  teamId: string;
  currency: string;
}

interface Known {
  materialIds: IdByKey;
  constituentIds: IdByKey;
}

/** The suppliers, their grades of the materials, what those contain, and what they cost in which pack. */
export async function loadQualities(tx: Transaction, house: House, library: DemoLibrary, known: Known) {
  const { teamId } = house;
  const supplierIds = newIds(library.suppliers.map((s) => s.key));
  const ids = newIds(library.qualities.map((q) => q.key));
  const each = <T>(rowsOf: (quality: DemoQuality, qualityId: string) => T[]): T[] =>
    library.qualities.flatMap((quality) => rowsOf(quality, ids.get(quality.key)!));

  await insertRows(
    tx,
    suppliers,
    library.suppliers.map((s) => ({
      teamId,
      id: supplierIds.get(s.key)!,
      name: s.name,
      note: `${s.note} Invented. Orders to ${s.email}, about ${s.leadDays} days, at least ${s.currency} ${s.minOrder}.`,
    })),
  );
  const flashPoints = new Map(library.materials.map((m) => [m.key, m.flashPoint?.celsius]));
  const seen = new Map<string, number>();
  await insertRows(
    tx,
    qualities,
    each((q, id) => {
      const later = (seen.get(q.material) ?? 0) + 1;
      if (!q.preferred) seen.set(q.material, later);
      return [
        {
          teamId,
          id,
          materialId: known.materialIds.get(q.material)!,
          supplierId: supplierIds.get(q.supplier)!,
          position: q.preferred ? 0 : later,
          flashPointC: flashPoints.get(q.material)?.toFixed(1) ?? null,
          ...qualityRow(q),
        },
      ];
    }),
  );
  await insertRows(
    tx,
    qualityConstituents,
    each((q, qualityId) =>
      q.constituents.map((c) => ({
        teamId,
        qualityId,
        constituentId: known.constituentIds.get(c.constituent)!,
        minFraction: fractionOfPercent(c.minPct, 'down'),
        typicalFraction: fractionOfPercent(c.typicalPct),
        maxFraction: fractionOfPercent(c.maxPct, 'up'),
        source: sourceLine(c, 300),
      })),
    ),
  );
  await insertRows(
    tx,
    offers,
    each((q, qualityId) =>
      q.offers.map(({ packAmount, packUnit, price, date }) => ({
        teamId,
        id: newId(),
        qualityId,
        packAmount: packAmount.toFixed(6),
        packUnit,
        price,
        currency: house.currency,
        offeredOn: date,
      })),
    ),
  );
  return { supplierIds, qualityIds: ids };
}

function qualityRow(q: DemoQuality) {
  const said = q.declaration;
  return {
    code: q.supplierCode,
    grade: q.grade,
    origin: q.origin,
    completeness: q.completeness,
    compositionSource: said ? `${said.title}, ${said.date}. ${said.note}` : 'No composition from the supplier.',
    densityGPerMl: q.densityGPerMl?.toFixed(4) ?? null,
    form: q.form,
    warmToC: q.warmToC?.toFixed(1) ?? null,
    colour: q.colour,
  };
}
