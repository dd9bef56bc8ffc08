import { Button } from '@/app/_components/ui/button';
import type { Clash } from '@/lib/shared/blend-clash';
import type { BenchParts } from './parts';

interface ClashPanelProps {
  clash: Clash;
  proof: string;
  onChange: BenchParts['onChange'];
}

/** Nothing fits: which rules cannot be kept together, and what each would have to become. */
export function ClashPanel({ clash, proof, onChange }: ClashPanelProps) {
  return (
    <section className="grid gap-5 p-5 md:p-6" aria-live="polite">
      <div>
        <h2 className="text-title">Nothing fits these rules</h2>
        <p className="mt-1 text-ink-soft">{proof}</p>
      </div>
      {clash.rules.length > 0 ? (
        <div>
          <p className="font-[560]">
            {clash.rules.length > 1 ? 'These cannot be kept together:' : 'This cannot be kept:'}
          </p>
          <ul className="mt-1 grid list-disc gap-1 pl-5">
            {clash.rules.map((rule) => (
              <li key={rule} className="first-letter:uppercase">
                {rule}
              </li>
            ))}
          </ul>
        </div>
      ) : null}
      {clash.ways.length > 0 ? (
        <div>
          <p className="font-[560]">Any one of these makes room:</p>
          <ul className="mt-2 grid gap-2">
            {clash.ways.map((way) => (
              <li
                key={way.words}
                className="flex flex-wrap items-center justify-between gap-3 border-t border-grout pt-2"
              >
                <span>{way.words}</span>
                <Button size="small" onClick={() => onChange(way.request)} aria-label={`Apply: ${way.words}`}>
                  Apply
                </Button>
              </li>
            ))}
          </ul>
        </div>
      ) : (
        <p className="text-ink-soft">
          Loosen one of the rules: a higher price, less strength, fewer materials that must be in it.
        </p>
      )}
    </section>
  );
}
