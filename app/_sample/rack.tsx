import { memo } from 'react';
import { Strip } from '../_components/strip/strip';
import { classNames } from '../_components/ui/class-names';
import { SAMPLE, type SampleMaterial, sampleProfile, shortName } from './sample';
import type { SampleAnswer } from './sample-answer';

/** Parts of a strip's length: what shows of one that is not used, and of one that does nearly everything. */
const RESTING = 0.2;
const DRAWN = 0.5;

/** All candidates in their holder; those in the blend are drawn out, the further the more of the smell they make. */
export const Rack = memo(function Rack({ lines }: { lines: SampleAnswer['lines'] }) {
  const impact = new Map(lines.map((line) => [line.key, line.impact]));
  const most = Math.max(...impact.values(), 1e-9);
  return (
    <div aria-hidden="true" className="flex px-4 md:px-10">
      {SAMPLE.candidates.map((material) => (
        <Place key={material.key} material={material} part={(impact.get(material.key) ?? 0) / most} />
      ))}
    </div>
  );
});

/** `part` is the impact beside that of the strongest line, 0 where the material is not in the blend. */
const Place = memo(function Place({ material, part }: { material: SampleMaterial; part: number }) {
  const shows = part > 0 ? DRAWN + (1 - DRAWN) * Math.sqrt(part) : RESTING;
  return (
    <div className="min-w-0 flex-1">
      <div className="overflow-clip px-[8%]">
        <div
          className={classNames(
            'transition-transform duration-300 ease-settle will-change-transform',
            part === 0 && 'opacity-60',
          )}
          style={{ transform: `translateY(${((1 - shows) * 100).toFixed(1)}%)` }}
        >
          <StandingStrip material={material} />
        </div>
      </div>
      <div className="flex h-2 justify-center border-t-2 border-ink bg-paper md:h-44 md:border-b md:pt-3">
        <span
          className={classNames(
            'narrow hidden text-note leading-none whitespace-nowrap [writing-mode:vertical-rl] md:block',
            part > 0 ? 'font-[650]' : 'text-ink-faint',
          )}
        >
          {shortName(material)}
        </span>
      </div>
    </div>
  );
});

const StandingStrip = memo(function StandingStrip({ material }: { material: SampleMaterial }) {
  return (
    <Strip
      size="line"
      decorative
      facets={SAMPLE.facets}
      profile={sampleProfile(material)}
      className="block h-auto w-full"
    />
  );
});
