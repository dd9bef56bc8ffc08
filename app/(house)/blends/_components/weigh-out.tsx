'use client';

import { useState } from 'react';
import { Select } from '@/app/_components/ui/field';
import { Mark } from '@/app/_components/ui/mark';
import { NumberField } from '@/app/_components/ui/number-field';
import { Table, Td, Th } from '@/app/_components/ui/table';
import { roundToBalance } from '@/engine/weigh/round-to-balance';

interface WeighOutProps {
  lines: readonly { id: string; name: string; share: number }[];
}

const READABILITIES = [0.1, 0.01, 0.001, 0.0001];

/** What to put on the balance: rounded to its readability with the total kept, and what is too little to weigh. */
export function WeighOut({ lines }: WeighOutProps) {
  const [batch, setBatch] = useState(10);
  const [readability, setReadability] = useState(0.001);
  const names = new Map(lines.map(({ id, name }) => [id, name]));
  const weighed = roundToBalance(
    lines.map(({ id, share }) => ({ id, share })),
    batch,
    readability,
  );
  const vanished = weighed.filter((line) => line.vanished);
  const digits = Math.max(0, Math.round(-Math.log10(readability)));
  const total = weighed.reduce((sum, { grams }) => sum + grams, 0);
  return (
    <div className="grid gap-4">
      <div className="grid grid-cols-2 gap-3">
        <NumberField
          label="Batch"
          unit="g"
          value={batch}
          min={readability}
          max={100_000}
          digits={4}
          onChange={(value) => value && value >= readability && setBatch(value)}
        />
        <Select
          label="Balance reads to"
          value={String(readability)}
          onChange={(event) => setReadability(Number(event.target.value))}
          options={READABILITIES.map((step) => ({ value: String(step), label: `${step} g` }))}
        />
      </div>
      <Table label="Weights" className="-mx-5 w-[calc(100%+2.5rem)]">
        <thead>
          <tr>
            <Th>Material</Th>
            <Th numeric>Weigh, g</Th>
          </tr>
        </thead>
        <tbody>
          {weighed.map(({ id, grams, vanished: isGone }) => (
            <tr key={id}>
              <Td>{names.get(id)}</Td>
              <Td numeric>{isGone ? <Mark state="unknown">too little to weigh</Mark> : grams.toFixed(digits)}</Td>
            </tr>
          ))}
        </tbody>
        <tfoot>
          <tr className="font-[560]">
            <Td className="border-b-0">Total</Td>
            <Td numeric className="border-b-0">
              {total.toFixed(digits)}
            </Td>
          </tr>
        </tfoot>
      </Table>
      {vanished.length > 0 ? (
        <p>
          {vanished.length === 1 ? 'One line is' : `${vanished.length} lines are`} below the balance: make a
          pre-dilution of it, or a larger batch.
        </p>
      ) : null}
      <Cautions />
    </div>
  );
}

function Cautions() {
  return (
    <div className="grid gap-1 border-l-2 border-ink pl-3 text-ink-soft">
      <p>
        Common practice: gloves and glasses, good air, no open flame; mighty materials and skin sensitisers in dilution;
        paper before skin.
      </p>
      <p>
        Each supplier’s safety data sheet, your local rules and qualified people come before anything said here. Nothing
        here says that a product may be sold: check the current standard and a qualified safety assessor.
      </p>
    </div>
  );
}
