import { Decimal, decimalOfTyped } from '@/lib/shared/decimal';
import type { QualityView } from '@/lib/shared/material-view';
import { fractionText, percentText } from './material-draft';

/* A quality while it is being written: text as typed, fractions in per cent. */

export interface RangeDraft {
  constituentId: string;
  min: string;
  typical: string;
  max: string;
  source: string;
}

export interface OfferDraft {
  id?: string;
  packAmount: string;
  packUnit: 'g' | 'mL';
  price: string;
  currency: string;
  offeredOn: string;
}

export interface QualityDraft {
  supplierId: string;
  preferred: boolean;
  code: string;
  grade: string;
  origin: string;
  form: QualityView['form'];
  densityGPerMl: string;
  warmToC: string;
  flashPointC: string;
  colour: string;
  completeness: QualityView['completeness'];
  compositionSource: string;
  constituents: RangeDraft[];
  offers: OfferDraft[];
}

export const NEW_QUALITY: QualityDraft = {
  ...{ supplierId: '', preferred: false, code: '', grade: '', origin: '', form: 'mobile liquid', densityGPerMl: '' },
  ...{ warmToC: '', flashPointC: '', colour: '', completeness: 'unknown', compositionSource: '' },
  ...{ constituents: [], offers: [] },
};

const plain = (text: string | null | undefined) => (text ? new Decimal(text).toFixed() : '');

export function qualityDraft(view: QualityView): QualityDraft {
  return {
    supplierId: view.supplier?.id ?? '',
    preferred: view.preferred,
    code: view.code ?? '',
    grade: view.grade,
    origin: view.origin ?? '',
    form: view.form,
    densityGPerMl: plain(view.densityGPerMl),
    warmToC: plain(view.warmToC),
    flashPointC: plain(view.flashPointC),
    colour: view.colour ?? '',
    completeness: view.completeness,
    compositionSource: view.compositionSource ?? '',
    constituents: view.constituents.map(({ constituentId, minFraction, typicalFraction, maxFraction, source }) => ({
      constituentId,
      min: percentText(minFraction),
      typical: typicalFraction === null ? '' : percentText(typicalFraction),
      max: percentText(maxFraction),
      source: source ?? '',
    })),
    offers: (view.offers ?? []).map(({ id, packAmount, packUnit, price, currency, offeredOn }) => ({
      ...{ id, packUnit, currency, offeredOn, packAmount: plain(packAmount), price: plain(price) },
    })),
  };
}

export function qualityOfDraft(draft: QualityDraft) {
  const { supplierId, preferred, code, grade, form } = draft;
  const decimal = (text: string) => (text.trim() === '' ? null : decimalOfTyped(text));
  return {
    ...{ supplierId, preferred, code, grade, form },
    origin: draft.origin || null,
    colour: draft.colour || null,
    densityGPerMl: decimal(draft.densityGPerMl),
    warmToC: decimal(draft.warmToC),
    flashPointC: decimal(draft.flashPointC),
    ...compositionOfDraft(draft),
    offers: offersOfDraft(draft),
  };
}

export function compositionOfDraft({ completeness, compositionSource, constituents }: QualityDraft) {
  return {
    completeness,
    compositionSource,
    constituents: constituents.map(({ constituentId, min, typical, max, source }) => ({
      constituentId,
      minFraction: fractionText(min),
      typicalFraction: typical.trim() === '' ? null : fractionText(typical),
      maxFraction: fractionText(max),
      source,
    })),
  };
}

export const offersOfDraft = ({ offers }: QualityDraft) =>
  offers.map(({ id, packAmount, price, ...offer }) => ({
    ...(id && { id }),
    ...offer,
    packAmount: decimalOfTyped(packAmount),
    price: decimalOfTyped(price),
  }));

export const QUALITY_FIELDS: Record<keyof QualityDraft, string> = {
  supplierId: 'Supplier',
  preferred: 'Preferred',
  code: 'Supplier’s code',
  grade: 'Grade',
  origin: 'Origin',
  form: 'Form',
  densityGPerMl: 'Density, g/mL',
  warmToC: 'Warm to, °C',
  flashPointC: 'Flash point, °C',
  colour: 'Colour',
  completeness: 'Completeness',
  compositionSource: 'Document of the composition',
  constituents: 'Constituents',
  offers: 'Offers',
};
