import { Tile } from '@/app/_components/ui/screen';
import { Slider } from '@/app/_components/ui/slider';
import { Switch } from '@/app/_components/ui/switch';
import type { BlendAnswer } from '@/lib/shared/blend-answer';
import type { BlendRequest } from '@/lib/shared/blend-input';
import type { Relief } from '@/lib/shared/blend-relief';
import { MaterialRules } from './material-rules';
import { MoreRules } from './more-rules';
import type { BenchParts } from './parts';
import { PriceRule } from './price-rule';
import { ProductRule } from './product-rule';
import { ReliefNote } from './relief-note';

export interface RulesProps extends BenchParts {
  request: BlendRequest;
  answer: BlendAnswer | null;
  /** In a sheet, which says the title itself. */
  isInSheet?: boolean;
}

export function RulesPanel(props: RulesProps) {
  const { request, answer, byId, isInSheet, onChange } = props;
  const targetName =
    request.target.kind === 'material' ? (byId.get(request.target.materialId)?.name ?? 'the target') : 'linalool';
  const reliefOf = (...kinds: Relief['kind'][]) => answer?.reliefs.filter(({ kind }) => kinds.includes(kind)) ?? [];
  return (
    <Tile title={isInSheet ? undefined : 'Rules'}>
      <div className="grid gap-6">
        <PriceRule {...props} reliefs={reliefOf('price per kg', 'price at equal strength')} />
        <div>
          <Slider
            label="At least as strong as"
            value={Math.round((request.minStrength ?? 0) * 100)}
            onChange={(value) => onChange({ ...request, minStrength: value > 0 ? value / 100 : null })}
            min={0}
            max={200}
            step={1}
            unit={`% of ${short(targetName)}`}
          />
          <ReliefNote reliefs={reliefOf('strength')} />
        </div>
        <div>
          <Slider
            label="Natural share, at least"
            value={Math.round((request.minNatural ?? 0) * 100)}
            onChange={(value) => onChange({ ...request, minNatural: value > 0 ? value / 100 : null })}
            min={0}
            max={100}
            step={1}
            unit="%"
            ends={['any', 'all natural']}
          />
          <ReliefNote reliefs={reliefOf('natural')} />
        </div>
        <ProductRule {...props} reliefs={reliefOf('limit')} />
        <Switch
          label="Leave out incomplete compositions"
          hint="A material whose composition is not fully stated leaves every limit unknown."
          checked={request.leaveOutIncomplete}
          onChange={(event) => onChange({ ...request, leaveOutIncomplete: event.target.checked })}
        />
        <MaterialRules {...props} reliefs={reliefOf('kept', 'required', 'largest share')} />
        <MoreRules {...props} />
      </div>
    </Tile>
  );
}

/** A name beside a figure in a narrow column. */
const short = (name: string): string => (name.length > 18 ? 'the target' : name);
