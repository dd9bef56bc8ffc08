import type { Candidate } from '@/lib/shared/blend-candidate';
import type { BlendRequest } from '@/lib/shared/blend-input';
import type { BlendInputs } from '@/lib/shared/blend-problem';
import type { FacetView } from '@/lib/shared/facet';
import type { LimitTables } from '@/lib/shared/limit-view';

/** What every panel of the bench may need. */
export interface BenchParts {
  facets: readonly FacetView[];
  currency: string;
  inputs: BlendInputs;
  tables: LimitTables;
  byId: ReadonlyMap<string, Candidate>;
  /** A sentence for each field of the request that is at fault. */
  faults: Record<string, string>;
  onChange: (next: BlendRequest) => void;
}
