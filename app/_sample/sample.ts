import type { FacetTone } from '@/lib/shared/facet';
import library from './rose.json';

/** One material of the sample, as the public page and the door show it. Prices, strengths and ratings are invented. */
export interface SampleMaterial {
  key: string;
  name: string;
  latin?: string;
  /** Facet id to intensity 0..10 and its standard deviation; a facet that is not named is 0. */
  profile: Record<string, [intensity: number, sd: number]>;
  strength: number;
  costPerKg: number;
  natural: number;
  maxShare?: number;
  evaporation?: number;
}

interface SampleLibrary {
  facets: FacetTone[];
  target: SampleMaterial;
  candidates: SampleMaterial[];
}

/** A rose on a budget: part of the sample library; tests/app/sample/rose.test.ts holds it to db/demo. */
export const SAMPLE = library as unknown as SampleLibrary;

/** Intensities in the order of the sample's facets. */
export const sampleProfile = (material: SampleMaterial): number[] =>
  SAMPLE.facets.map((facet) => material.profile[facet.id]?.[0] ?? 0);

export const sampleSpread = (material: SampleMaterial): number[] =>
  SAMPLE.facets.map((facet) => material.profile[facet.id]?.[1] ?? 0);

/** "Rose absolute" of "Rose absolute (Rosa x damascena)": the Latin is set apart, in its own face. */
export const shortName = (material: SampleMaterial): string => material.name.replace(/ \(.*\)$/, '');
