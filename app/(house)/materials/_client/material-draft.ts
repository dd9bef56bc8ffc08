import { DECIMAL_TEXT, Decimal, decimalOfTyped } from '@/lib/shared/decimal';
import type { MaterialView } from '@/lib/shared/material-view';
import type { CautionCode, MaterialKind } from '@/lib/shared/material-words';

/* A material while it is being written: text as typed, shares in per cent, so that nothing typed is ever refused a place. */

export interface FacetEntry {
  facetId: string;
  phase: 'all' | 'opening' | 'heart' | 'dry';
  intensity: number;
  sd: number;
}

export interface MaterialDraft {
  name: string;
  kind: MaterialKind;
  botanicalName: string;
  plantPart: string;
  chemicalName: string;
  inciName: string;
  /** One a line. */
  synonyms: string;
  cas: string[];
  smell: string;
  naturalShare: string;
  strength: string;
  strengthSpread: string;
  strengthClass: MaterialView['strengthClass'];
  strengthSource: string;
  vapourPressurePa: string;
  vapourPressureSource: string;
  odourThresholdUgPerM3: string;
  odourThresholdSource: string;
  evaporationPerHour: string;
  evaporationSource: string;
  usualDilution: string;
  dilutionSolvent: string;
  maxShare: string;
  note: string;
  facets: FacetEntry[];
  cautions: { code: CautionCode; source: string }[];
}

export const NEW_MATERIAL: MaterialDraft = {
  ...{ name: '', kind: 'synthetic', botanicalName: '', plantPart: '', chemicalName: '', inciName: '', synonyms: '' },
  ...{ cas: [''], smell: '', naturalShare: '0', strength: '1', strengthSpread: '2', strengthClass: 'medium' },
  ...{ strengthSource: 'estimate', vapourPressurePa: '', vapourPressureSource: '', odourThresholdUgPerM3: '' },
  ...{ odourThresholdSource: '', evaporationPerHour: '', evaporationSource: '', usualDilution: '100' },
  ...{ dilutionSolvent: '', maxShare: '', note: '', facets: [], cautions: [] },
};

const TEXTS = [
  ...(['name', 'botanicalName', 'plantPart', 'chemicalName', 'inciName', 'smell', 'strengthSource'] as const),
  ...(['vapourPressureSource', 'odourThresholdSource', 'evaporationSource', 'dilutionSolvent', 'note'] as const),
];
const SHARES = ['naturalShare', 'usualDilution', 'maxShare'] as const;
const MEASURES = [
  ...(['strength', 'strengthSpread', 'vapourPressurePa', 'odourThresholdUgPerM3', 'evaporationPerHour'] as const),
];
const OPTIONAL_TEXTS = new Set<string>(TEXTS.filter((name) => !['name', 'smell', 'strengthSource'].includes(name)));

export function materialDraft(view: MaterialView): MaterialDraft {
  const from = <K extends keyof MaterialView>(names: readonly K[], say: (value: MaterialView[K]) => string) =>
    Object.fromEntries(names.map((name) => [name, view[name] === null ? '' : say(view[name])]));
  return {
    ...NEW_MATERIAL,
    ...from(TEXTS, String),
    ...from(SHARES, (share) => percentText(String(share))),
    ...from(MEASURES, String),
    kind: view.kind,
    strengthClass: view.strengthClass,
    synonyms: view.synonyms.join('\n'),
    cas: view.cas.length > 0 ? view.cas : [''],
    facets: view.facets,
    cautions: view.cautions,
  };
}

/** What the schema of the API is asked about: it says what is wrong, in the words of the field. */
export function materialOfDraft(draft: MaterialDraft): unknown {
  const each = <K extends keyof MaterialDraft>(names: readonly K[], read: (text: string, name: K) => unknown) =>
    Object.fromEntries(names.map((name) => [name, read(String(draft[name]).trim(), name)]));
  return {
    ...each(TEXTS, (text, name) => (text === '' && OPTIONAL_TEXTS.has(name) ? null : text)),
    ...each(SHARES, (text, name) => (text === '' && name !== 'naturalShare' ? null : fractionText(text))),
    ...each(MEASURES, (text) => (text === '' ? null : Number(decimalOfTyped(text)))),
    kind: draft.kind,
    strengthClass: draft.strengthClass,
    synonyms: draft.synonyms
      .split('\n')
      .map((name) => name.trim())
      .filter(Boolean),
    cas: draft.cas.map((cas) => cas.trim()).filter(Boolean),
    facets: draft.facets,
    cautions: draft.cautions,
  };
}

/** "0.355" is "35.5". */
export const percentText = (fraction: string): string => new Decimal(fraction).times(100).toFixed();

/** "35,5" is "0.355"; what is no number goes on as it is, for the schema to name. */
export function fractionText(percent: string): string {
  const text = decimalOfTyped(percent);
  return DECIMAL_TEXT.test(text) ? new Decimal(text).div(100).toFixed() : percent;
}

export const MATERIAL_FIELDS: Record<keyof MaterialDraft, string> = {
  name: 'Name',
  kind: 'Kind',
  botanicalName: 'Botanical name',
  plantPart: 'Plant part',
  chemicalName: 'Chemical name',
  inciName: 'INCI name',
  synonyms: 'Synonyms',
  cas: 'CAS numbers',
  smell: 'In a smeller’s words',
  naturalShare: 'Natural share, %',
  strength: 'Odour strength',
  strengthSpread: 'Factor of the strength',
  strengthClass: 'Strength in words',
  strengthSource: 'Source of the strength',
  vapourPressurePa: 'Vapour pressure, Pa',
  vapourPressureSource: 'Source of the vapour pressure',
  odourThresholdUgPerM3: 'Odour threshold, µg/m³',
  odourThresholdSource: 'Source of the odour threshold',
  evaporationPerHour: 'Evaporation, per hour',
  evaporationSource: 'Source of the evaporation',
  usualDilution: 'Usual dilution, %',
  dilutionSolvent: 'Solvent of the dilution',
  maxShare: 'Largest share in a concentrate, %',
  note: 'Note',
  facets: 'Facets',
  cautions: 'Cautions',
};
