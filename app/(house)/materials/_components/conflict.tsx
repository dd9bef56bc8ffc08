'use client';

import { type ReactNode, useState } from 'react';
import { Button } from '@/app/_components/ui/button';
import { Choice } from '@/app/_components/ui/choice';
import { ScreenHead } from '@/app/_components/ui/screen';

interface ConflictProps<D extends object> {
  what: string;
  base: D;
  mine: D;
  theirs: D;
  names: Record<keyof D, string>;
  show: (field: keyof D, value: D[keyof D]) => ReactNode;
  onSettle: (merged: D) => void;
  onCancel: () => void;
}

type Side = 'mine' | 'theirs';
const same = (a: unknown, b: unknown) => JSON.stringify(a) === JSON.stringify(b);

/**
 * Two people wrote at the same time. Fields that only one of them changed are taken from that one; the person decides
 * the others, sees both sides of all, and saves afterwards.
 */
export function Conflict<D extends object>({
  what,
  base,
  mine,
  theirs,
  names,
  show,
  onSettle,
  onCancel,
}: ConflictProps<D>) {
  const fields = (Object.keys(names) as (keyof D)[]).filter((field) => !same(mine[field], theirs[field]));
  const [sides, setSides] = useState<Partial<Record<keyof D, Side>>>(
    () =>
      Object.fromEntries(fields.map((field) => [field, same(mine[field], base[field]) ? 'theirs' : 'mine'])) as never,
  );
  const merged = () => {
    const taken = Object.fromEntries(
      fields.map((field) => [field, sides[field] === 'theirs' ? theirs[field] : mine[field]]),
    );
    return { ...mine, ...taken } as D;
  };
  return (
    <>
      <ScreenHead
        title="Changed meanwhile"
        about={`Somebody else saved this ${what} while you were writing. Nothing is overwritten: choose for each field that differs, then look it over and save.`}
      />
      <div className="grid border-t border-ink">
        {fields.map((field) => {
          const both = !same(mine[field], base[field]) && !same(theirs[field], base[field]);
          return (
            <section key={String(field)} className="grid gap-3 border-b border-grout px-5 py-4 md:px-8">
              <div className="flex flex-wrap items-center justify-between gap-3">
                <h2 className="text-lead">
                  {names[field]}
                  {both ? <span className="text-ink-soft"> — changed by both</span> : null}
                </h2>
                <Choice<Side>
                  label={`Which ${names[field]} to keep`}
                  hideLabel
                  value={sides[field] ?? 'mine'}
                  onChange={(side) => setSides((before) => ({ ...before, [field]: side }))}
                  options={[
                    { value: 'mine', label: 'Keep mine' },
                    { value: 'theirs', label: 'Take theirs' },
                  ]}
                />
              </div>
              <div className="grid gap-4 sm:grid-cols-2">
                <Version title="Mine" chosen={sides[field] !== 'theirs'}>
                  {show(field, mine[field])}
                </Version>
                <Version title="Theirs, saved" chosen={sides[field] === 'theirs'}>
                  {show(field, theirs[field])}
                </Version>
              </div>
            </section>
          );
        })}
        {fields.length === 0 ? <p className="px-5 py-6 md:px-8">Both of you wrote the same.</p> : null}
      </div>
      <div className="flex gap-3 px-5 py-4 md:px-8">
        <Button look="solid" onClick={() => onSettle(merged())}>
          Go on with these
        </Button>
        <Button onClick={onCancel}>Back to mine</Button>
      </div>
    </>
  );
}

function Version({ title, chosen, children }: { title: string; chosen: boolean; children: ReactNode }) {
  return (
    <div className={chosen ? 'border-l-2 border-ink pl-3 font-[560]' : 'border-l border-grout pl-3 text-ink-soft'}>
      <p className="narrow text-note font-normal">{title}</p>
      <div className="wrap-anywhere whitespace-pre-wrap">{children || 'nothing'}</div>
    </div>
  );
}
