import { Select } from '@/app/_components/ui/field';
import { NumberField } from '@/app/_components/ui/number-field';
import type { Relief } from '@/lib/shared/blend-relief';
import { Decimal } from '@/lib/shared/decimal';
import { ReliefNote } from './relief-note';
import type { RulesProps } from './rules-panel';

/** A usual strength to begin with, by common practice; the person knows the product. */
const USUAL_PCT: Record<string, string> = { 'leave-on': '15', 'rinse-off': '1', household: '1', oral: '0.5' };

export function ProductRule(props: RulesProps & { reliefs: readonly Relief[] }) {
  const { request, tables, reliefs, faults, onChange } = props;
  const { product } = request;
  function choose(category: string) {
    const exposure = tables.categories.find(({ code }) => code === category)?.exposure ?? '';
    const concentratePct = product?.concentratePct ?? USUAL_PCT[exposure] ?? '5';
    onChange({ ...request, product: category ? { category, concentratePct } : null });
  }
  return (
    <div className="grid gap-3">
      <Select
        label="What it goes into"
        value={product?.category ?? ''}
        onChange={(event) => choose(event.target.value)}
        options={[
          { value: '', label: 'Not said: no limits' },
          ...tables.categories.map(({ code, name, exposure }) => ({
            value: code,
            label: `${code}  ${name} (${exposure})`,
          })),
        ]}
        error={faults['product.category']}
      />
      {product ? (
        <NumberField
          label="Concentrate in product"
          unit="% w/w"
          value={Number(product.concentratePct)}
          min={0.01}
          max={100}
          digits={3}
          onChange={(value) => {
            if (value && value > 0)
              onChange({ ...request, product: { ...product, concentratePct: new Decimal(value).toFixed() } });
          }}
          error={faults['product.concentratePct']}
        />
      ) : null}
      <ReliefNote reliefs={reliefs} />
    </div>
  );
}
