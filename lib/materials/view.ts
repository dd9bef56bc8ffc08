import 'server-only';
import type { Member } from '@/lib/auth/member';
import { viewCost } from '@/lib/prices/view';
import { lastsHours } from '@/lib/shared/lasting';
import type { MaterialRow } from '@/lib/shared/material';
import type { MaterialView, QualityView } from '@/lib/shared/material-view';
import type { CautionCode, MaterialKind } from '@/lib/shared/material-words';
import { may } from '@/lib/shared/permissions';
import { materialCost } from '@/lib/shared/price';
import type { MaterialRecord, RowParts } from './rows';
import type { Smell } from './smell';

/* What may leave the server for this member. A field that the roles may not see is not in the answer at all. */

export function viewRow(ctx: Member, { record, cas, smell, terms }: RowParts, packGrams: string): MaterialRow {
  const cost =
    terms && may(ctx.roles, 'price.read')
      ? materialCost({ strength: record.strength, qualities: terms }, ctx.currency, packGrams)
      : null;
  return {
    id: record.id,
    name: record.name,
    kind: record.kind as MaterialKind,
    botanicalName: record.botanicalName,
    cas,
    profile: smell.profile,
    phases: smell.phases,
    naturalShare: record.naturalShare,
    strength: record.strength,
    strengthClass: record.strengthClass as MaterialRow['strengthClass'],
    lastsHours: lastsHours(record.evaporationPerHour),
    updatedAt: record.updatedAt.toISOString(),
    ...(cost && { costPerKg: viewCost(cost.perKg), costAtEqualStrength: viewCost(cost.atEqualStrength) }),
  };
}

export interface MaterialParts {
  record: MaterialRecord;
  synonyms: string[];
  cas: string[];
  smell: Smell;
  cautions: { code: string; source: string }[];
  qualities: QualityView[];
  parts: { materialId: string; name: string; share: string }[];
}

export function viewMaterial(ctx: Member, all: MaterialParts): MaterialView {
  const { teamId: _, createdAt: __, ...record } = all.record;
  return {
    ...record,
    kind: record.kind as MaterialKind,
    strengthClass: record.strengthClass as MaterialView['strengthClass'],
    updatedAt: record.updatedAt.toISOString(),
    lastsHours: lastsHours(record.evaporationPerHour),
    synonyms: all.synonyms,
    cas: all.cas,
    facets: all.smell.entries,
    profile: all.smell.profile,
    profileSd: all.smell.profileSd,
    phases: all.smell.phases,
    cautions: all.cautions.map(({ code, source }) => ({ code: code as CautionCode, source })),
    qualities: all.qualities,
    ...(may(ctx.roles, 'blend.read') && { parts: all.parts }),
    ...(may(ctx.roles, 'price.read') && { currency: ctx.currency }),
  };
}
