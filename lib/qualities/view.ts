import 'server-only';
import type { qualities } from '@/db/schema';
import type { Member } from '@/lib/auth/member';
import type { OfferRow } from '@/lib/prices/queries';
import { viewOffer } from '@/lib/prices/view';
import type { QualityView } from '@/lib/shared/material-view';
import { may } from '@/lib/shared/permissions';
import type { RangeRow } from './queries';

interface QualityParts {
  quality: typeof qualities.$inferSelect;
  supplierName: string;
  preferred: boolean;
  ranges: RangeRow[];
  offers: OfferRow[];
  strength: number;
}

/** What may leave the server: supplier, code and documents with supplier.read, offers with price.read. */
export function viewQuality(ctx: Member, parts: QualityParts): QualityView {
  const { quality, supplierName, preferred, ranges, offers, strength } = parts;
  const seesSupplier = may(ctx.roles, 'supplier.read');
  return {
    id: quality.id,
    materialId: quality.materialId,
    revision: quality.revision,
    preferred,
    grade: quality.grade,
    origin: quality.origin,
    completeness: quality.completeness as QualityView['completeness'],
    densityGPerMl: quality.densityGPerMl,
    form: quality.form as QualityView['form'],
    warmToC: quality.warmToC,
    flashPointC: quality.flashPointC,
    colour: quality.colour,
    constituents: ranges.map(({ qualityId: _, source, ...range }) => ({ ...range, ...(seesSupplier && { source }) })),
    ...(seesSupplier && {
      supplier: { id: quality.supplierId, name: supplierName },
      code: quality.code,
      compositionSource: quality.compositionSource,
    }),
    ...(may(ctx.roles, 'price.read') && {
      offers: offers.map((offer) => viewOffer(offer, quality.densityGPerMl, strength)),
    }),
  };
}
