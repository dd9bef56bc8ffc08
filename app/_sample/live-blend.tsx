'use client';

import { memo, type ReactNode, useState } from 'react';
import { ProfileBars } from '../_components/charts/profile-bars';
import { Strip } from '../_components/strip/strip';
import { Tile } from '../_components/ui/screen';
import { Slider } from '../_components/ui/slider';
import { BlendLines } from './blend-lines';
import { PRICES } from './prices';
import { Rack } from './rack';
import { SAMPLE, sampleProfile, shortName } from './sample';
import type { SampleAnswer } from './sample-answer';
import { useSampleSolver } from './use-sample-solver';

const TARGET = sampleProfile(SAMPLE.target);
const NAME = shortName(SAMPLE.target);
const euro = new Intl.NumberFormat('en-GB', { style: 'currency', currency: 'EUR', maximumFractionDigits: 0 });
const points = new Intl.NumberFormat('en-GB', { minimumFractionDigits: 2, maximumFractionDigits: 2 });

/** A blend that is solved again in the visitor's browser at every move of the slider. `intro` stands beside it. */
export function LiveBlend({ first, intro }: { first: SampleAnswer; intro: ReactNode }) {
  const [answer, solve] = useSampleSolver(first);
  return (
    <>
      <div className="bench-tiles">
        <div className="grid gap-8 px-4 pt-10 pb-6 md:px-10 lg:grid-cols-[minmax(0,1fr)_25rem] lg:items-end lg:gap-16 lg:pt-14">
          {intro}
          <div className="label-plate grid gap-5 p-6">
            <p>
              <span className="block text-title font-[560] [font-stretch:88%]">{NAME}</span>
              <span className="latin text-ink-soft">{SAMPLE.target.latin}</span>
              <span className="figures block">{euro.format(SAMPLE.target.costPerKg)} a kilogram</span>
            </p>
            <PriceSlider first={first.price} onPrice={solve} />
            <Outcome answer={answer} />
          </div>
        </div>
        <Rack lines={answer.lines} />
      </div>
      <Details answer={answer} />
    </>
  );
}

/** Keeps the price to itself, so that a move of the thumb draws the thumb and nothing else. */
const PriceSlider = memo(function PriceSlider({ first, onPrice }: { first: number; onPrice: (price: number) => void }) {
  const [price, setPrice] = useState(first);
  return (
    <Slider
      label="For as much smell, at most"
      value={price}
      onChange={(next) => {
        setPrice(next);
        onPrice(next);
      }}
      min={PRICES.min}
      max={PRICES.max}
      step={PRICES.step}
      formatOptions={{ style: 'currency', currency: 'EUR', maximumFractionDigits: 0 }}
      ends={['cheaper', 'closer']}
    />
  );
});

const Details = memo(function Details({ answer }: { answer: SampleAnswer }) {
  return (
    <div className="tiles lg:grid-cols-[minmax(0,3fr)_minmax(0,4fr)_minmax(0,4fr)]">
      <Tile title="Side by side">
        <Pair profile={answer.profile} />
      </Tile>
      <Tile title="Facet by facet">
        <ProfileBars facets={SAMPLE.facets} target={TARGET} blend={answer.profile} targetName={NAME} most={14} />
      </Tile>
      <Tile title="Line by line">
        <BlendLines lines={answer.lines} />
      </Tile>
    </div>
  );
});

/** The answer in two sentences, and what it would cost to come closer. */
function Outcome({ answer }: { answer: SampleAnswer }) {
  const { lines, distance, per100More } = answer;
  const closer = per100More === null ? 0 : -per100More;
  return (
    <div className="grid gap-2 border-t border-grout pt-4">
      <p className="flex items-baseline gap-3">
        <span className="figures text-head leading-none font-[560] [font-stretch:88%]">{points.format(distance)}</span>
        <span className="text-ink-soft">
          points from it, on the 0–10 scale of facets, with {lines.length} of {SAMPLE.candidates.length} materials.
        </span>
      </p>
      <p className="text-ink-soft">
        {closer >= 0.005
          ? `The price holds it back: €100 more would bring it ${points.format(closer)} points closer.`
          : 'More money would hardly bring it closer.'}{' '}
        No other blend of these comes closer in this model; smell it next.
      </p>
    </div>
  );
}

function Pair({ profile }: { profile: number[] }) {
  return (
    <div className="flex justify-center gap-8 pt-3 md:gap-10">
      {[
        { name: NAME, shown: TARGET },
        { name: 'Blend', shown: profile },
      ].map(({ name, shown }) => (
        <figure key={name} className="grid justify-items-center gap-3">
          <Strip size="page" labels={false} facets={SAMPLE.facets} profile={shown} name={name} />
          <figcaption>{name}</figcaption>
        </figure>
      ))}
    </div>
  );
}
