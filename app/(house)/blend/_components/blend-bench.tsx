'use client';

import { parseAsString, useQueryStates } from 'nuqs';
import { useCallback, useMemo, useState } from 'react';
import { Button, ButtonLink } from '@/app/_components/ui/button';
import { Sheet } from '@/app/_components/ui/dialog';
import { ScreenHead } from '@/app/_components/ui/screen';
import { EmptyState, ErrorState, LoadingState } from '@/app/_components/ui/states';
import type { BlendRequest } from '@/lib/shared/blend-input';
import type { BlendInputs } from '@/lib/shared/blend-problem';
import type { FacetView } from '@/lib/shared/facet';
import type { LimitTables } from '@/lib/shared/limit-view';
import { withTarget } from '../_client/begin';
import { useFrontier, useSolved } from '../_client/use-solved';
import { useWide } from '../_client/use-wide';
import { AnswerPanel } from './answer-panel';
import { Below } from './below';
import { RulesPanel } from './rules-panel';
import { SaveButton } from './save-button';
import { TargetPanel } from './target-panel';

export interface BlendBenchProps {
  facets: readonly FacetView[];
  currency: string;
  maySave: boolean;
  start: BlendRequest | null;
  inputs: BlendInputs;
  tables: LimitTables;
  onPackGrams: (packGrams: BlendRequest['packGrams']) => void;
}

/** Target left, rules in the middle, answer right; on a phone the answer first, and the rules come from below. */
export function BlendBench({ facets, currency, maySave, start, inputs, tables, onPackGrams }: BlendBenchProps) {
  const [address, setAddress] = useQueryStates({ target: parseAsString, category: parseAsString });
  const [request, setRequest] = useState(() => start ?? fromAddress(address, inputs, tables));
  const { solved, asked, answer, faults, isBroken, search } = useSolved(inputs, request, currency);
  const frontier = useFrontier(inputs, request);
  const isWide = useWide();
  const [rulesOpen, setRulesOpen] = useState(false);

  const change = useCallback(
    (next: BlendRequest) => {
      setRequest(next);
      onPackGrams(next.packGrams);
      setAddress({
        target: next.target.kind === 'material' ? next.target.materialId : null,
        category: next.product?.category ?? null,
      });
    },
    [onPackGrams, setAddress],
  );
  const byId = useMemo(() => new Map(inputs.candidates.map((one) => [one.id, one])), [inputs]);
  const parts = { facets, currency, inputs, tables, byId, faults };
  const rules = request ? (
    <RulesPanel {...parts} request={request} answer={answer} isInSheet={!isWide} onChange={change} />
  ) : null;

  return (
    <>
      <ScreenHead
        title="Blend"
        about="The closest blend of other materials, within a price and within limits."
        actions={
          <>
            <ButtonLink href="/blends">Saved blends</ButtonLink>
            {maySave ? <SaveButton request={request} answer={answer} /> : null}
          </>
        }
      />
      {isBroken ? (
        <ErrorState title="Solving failed" onRetry={() => window.location.reload()}>
          The part of this page that solves has stopped. Saved blends are not touched by it.
        </ErrorState>
      ) : null}
      <div className="tiles lg:grid-cols-[19rem_minmax(0,1fr)] lg:grid-rows-[auto_1fr] xl:grid-cols-[18.5rem_20rem_minmax(0,1fr)]">
        <div className="xl:row-span-2">
          <div className={column}>
            <TargetPanel {...parts} request={request} isFolded={!isWide} onChange={change} />
          </div>
        </div>
        <div className={isWide ? 'lg:order-last xl:order-none xl:row-span-2' : 'hidden'}>
          <div className={column}>{isWide ? rules : null}</div>
        </div>
        <div className="lg:row-span-2">
          {request && answer && solved && asked ? (
            <AnswerPanel
              {...parts}
              request={request}
              answer={answer}
              solved={solved}
              asked={asked}
              search={search}
              onChange={change}
            />
          ) : (
            <NothingYet faults={faults} hasRequest={request !== null} />
          )}
        </div>
      </div>
      {request && answer && asked && answer.lines.length > 0 ? (
        <Below {...parts} request={request} answer={answer} asked={asked} frontier={frontier} onChange={change} />
      ) : null}
      {!isWide && rules ? (
        <>
          <div className="sticky bottom-[calc(3.5rem+env(safe-area-inset-bottom))] z-20 border-t border-ink bg-paper p-3 md:bottom-0">
            <Button look="solid" className="w-full" onClick={() => setRulesOpen(true)}>
              Rules: price, strength, limits
            </Button>
          </div>
          <Sheet open={rulesOpen} onOpenChange={setRulesOpen} title="Rules">
            <div className="-m-5">{rules}</div>
          </Sheet>
        </>
      ) : null}
    </>
  );
}

/** At the desk target and rules stay in sight while the answer is read. */
const column = 'xl:sticky xl:top-0 xl:max-h-dvh xl:overflow-y-auto';

function NothingYet({ faults, hasRequest }: { faults: Record<string, string>; hasRequest: boolean }) {
  const sentences = Object.values(faults);
  if (sentences.length > 0)
    return (
      <EmptyState title="This cannot be blended yet">
        {sentences.map((sentence) => (
          <p key={sentence}>{sentence}</p>
        ))}
      </EmptyState>
    );
  return hasRequest ? (
    <LoadingState>Solving</LoadingState>
  ) : (
    <EmptyState title="What shall it smell like?">
      Choose a material that is too dear, has run out or must be replaced, or draw the smell you want.
    </EmptyState>
  );
}

function fromAddress(
  { target, category }: { target: string | null; category: string | null },
  inputs: BlendInputs,
  tables: LimitTables,
): BlendRequest | null {
  const material = inputs.candidates.find(({ id }) => id === target);
  if (!material) return null;
  const request = withTarget(material, null);
  const known = tables.categories.some(({ code }) => code === category);
  return known && category ? { ...request, product: { category, concentratePct: '15' } } : request;
}
