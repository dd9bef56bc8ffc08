import { Strip } from '@/app/_components/strip/strip';
import { Button } from '@/app/_components/ui/button';
import { Combobox } from '@/app/_components/ui/combobox';
import { Tile } from '@/app/_components/ui/screen';
import type { Candidate } from '@/lib/shared/blend-candidate';
import { percent, pricePerKg } from '@/lib/shared/blend-figures';
import { type BlendRequest, requestFor } from '@/lib/shared/blend-input';
import { smellInWords } from '@/lib/shared/strip-bands';
import { drawnFrom, withTarget } from '../_client/begin';
import { FacetPanel } from './facet-panel';
import type { BenchParts } from './parts';

interface TargetPanelProps extends BenchParts {
  request: BlendRequest | null;
  /** On a phone it lies folded above the answer. */
  isFolded: boolean;
}

export function TargetPanel(props: TargetPanelProps) {
  const { request, isFolded, byId, facets, inputs } = props;
  if (!isFolded || !request)
    return (
      <Tile title="Target">
        <TargetFields {...props} />
      </Tile>
    );
  const material = materialOf(request, byId);
  return (
    <details className="group">
      <summary className="flex min-h-16 list-none items-center gap-3 px-5">
        <Strip size="node" facets={facets} profile={profileOf(request, material, inputs.facetIds)} decorative />
        <span className="min-w-0 flex-1">
          <span className="block text-note text-ink-soft">Target</span>
          <span className="block truncate font-[560]">{material?.name ?? 'Drawn profile'}</span>
        </span>
        <span className="underline underline-offset-4 group-open:hidden">Change</span>
        <span className="hidden underline underline-offset-4 group-open:inline">Fold</span>
      </summary>
      <div className="px-5 pb-5">
        <TargetFields {...props} />
      </div>
    </details>
  );
}

const materialOf = (request: BlendRequest | null, byId: BenchParts['byId']): Candidate | undefined =>
  request?.target.kind === 'material' ? byId.get(request.target.materialId) : undefined;

function profileOf(
  request: BlendRequest,
  material: Candidate | undefined,
  facetIds: readonly string[],
): readonly number[] {
  const { target } = request;
  if (target.kind === 'material') return material?.profile ?? [];
  return facetIds.map((id) => target.intensities[id] ?? 0);
}

function TargetFields(props: TargetPanelProps) {
  const { request, facets, inputs, byId, currency, onChange } = props;
  const material = materialOf(request, byId);
  const smelling = inputs.candidates.filter(({ strength }) => strength > 0);
  return (
    <div className="grid gap-5">
      <Combobox
        label="Smell like"
        placeholder="A material, by any letters"
        items={smelling.map((one) => ({ ...one, label: one.name, detail: one.botanicalName ?? undefined }))}
        value={material?.id ?? null}
        onChange={(id) => {
          const chosen = id ? byId.get(id) : undefined;
          if (chosen) onChange(withTarget(chosen, request));
        }}
        lead={(item) => <Strip size="node" facets={facets} profile={item.profile} decorative />}
      />
      {request ? null : (
        <Button onClick={() => onChange(drawnFrom([], inputs.facetIds, requestFor(NOTHING_DRAWN)))}>
          Draw a smell instead
        </Button>
      )}
      {material ? <MaterialFacts material={material} facets={facets} currency={currency} /> : null}
      {request ? (
        <FacetPanel
          request={request}
          facets={facets}
          profile={profileOf(request, material, inputs.facetIds)}
          onChange={onChange}
          onDraw={() => onChange(drawnFrom(material?.profile ?? [], inputs.facetIds, request))}
        />
      ) : null}
    </div>
  );
}

const NOTHING_DRAWN = { kind: 'drawn', name: 'Drawn profile', intensities: {} } as const;

interface MaterialFactsProps {
  material: Candidate;
  facets: BenchParts['facets'];
  currency: string;
}

function MaterialFacts({ material, facets, currency }: MaterialFactsProps) {
  const { name, profile, phases, costPerKg, strength, natural } = material;
  return (
    <div className="flex gap-4">
      <Strip size="line" facets={facets} profile={profile} phases={phases} name={name} />
      <div className="min-w-0 flex-1">
        <p className="pb-1 text-ink-soft first-letter:uppercase">{smellInWords(profile, facets)}</p>
        <p className="figures text-lead">{costPerKg ? pricePerKg(Number(costPerKg), currency) : 'Price not known'}</p>
        <p className="figures">{Number(strength.toPrecision(2))} times as strong as linalool</p>
        <p className="figures">{percent(natural)} natural</p>
      </div>
    </div>
  );
}
