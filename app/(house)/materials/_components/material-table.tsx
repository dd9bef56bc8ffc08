'use client';

import { defaultRangeExtractor, type Range, useWindowVirtualizer } from '@tanstack/react-virtual';
import { type KeyboardEvent, type RefObject, useEffect, useLayoutEffect, useRef, useState } from 'react';
import { classNames } from '@/app/_components/ui/class-names';
import { SortArrow } from '@/app/_components/ui/table';
import type { FacetView } from '@/lib/shared/facet';
import type { MaterialRow } from '@/lib/shared/material';
import { FIRST_ORDER, type MaterialSort } from '@/lib/shared/material-list';
import type { ListState } from '../_client/list-state';
import { GRID, MaterialLine } from './material-line';

interface MaterialTableProps {
  rows: readonly MaterialRow[];
  total: number;
  facets: readonly FacetView[];
  currency: string | null;
  state: ListState;
  setState: (change: { sort: MaterialSort; order: 'asc' | 'desc' | null }) => void;
  /** These rows answer the question before; the new ones are on their way. */
  isStale: boolean;
  onNearEnd: (() => void) | null;
}

const ROW_PX = 60;
const NEAR_END_ROWS = 25;

/** Rows of which only those in sight exist. The page itself scrolls; arrows, Page keys, Home and End walk the names. */
export function MaterialTable(props: MaterialTableProps) {
  const { rows, total, facets, currency, state, setState, isStale, onNearEnd } = props;
  const body = useRef<HTMLTableSectionElement>(null);
  const top = useTopOf(body);
  const [focused, setFocused] = useState<number | null>(null);
  const virtual = useWindowVirtualizer({
    count: rows.length,
    estimateSize: () => ROW_PX,
    overscan: 12,
    scrollMargin: top,
    // A focused row must not lie under the heads, nor under the bar of a phone.
    scrollPaddingStart: 44,
    scrollPaddingEnd: 72,
    initialRect: { width: 1000, height: 1000 },
    // The row with the focus stays, wherever one scrolls, or the focus would be lost.
    rangeExtractor: (range: Range) => {
      const seen = defaultRangeExtractor(range);
      return focused === null || focused >= rows.length || seen.includes(focused) ? seen : [...seen, focused];
    },
  });
  const items = virtual.getVirtualItems();
  const last = virtual.range?.endIndex ?? 0;
  useEffect(() => {
    if (onNearEnd && last >= rows.length - NEAR_END_ROWS) onNearEnd();
  }, [onNearEnd, last, rows.length]);

  const wanted = useRef<number | null>(null);
  useEffect(() => {
    // After every drawing: the row may only have come with the scroll.
    const link = body.current?.querySelector<HTMLElement>(`[data-row="${wanted.current}"] a`);
    if (!link) return;
    wanted.current = null;
    link.focus({ preventScroll: true });
  });
  function focusRow(index: number) {
    const row = Math.max(0, Math.min(rows.length - 1, index));
    wanted.current = row;
    setFocused(row);
    virtual.scrollToIndex(row, { align: 'auto' });
  }
  function onKeyDown(event: KeyboardEvent) {
    const at = rowAt(event.target);
    if (at === null || event.altKey || event.ctrlKey || event.metaKey) return;
    const to: Record<string, number> = {
      ArrowDown: at + 1,
      ArrowUp: at - 1,
      PageDown: at + 10,
      PageUp: at - 10,
      Home: 0,
      End: rows.length - 1,
    };
    const next = to[event.key];
    if (next === undefined) return;
    event.preventDefault();
    focusRow(next);
  }

  return (
    <table
      aria-label="Materials"
      aria-rowcount={total + 1}
      aria-busy={isStale}
      className={classNames('block w-full text-data', isStale && 'opacity-60')}
    >
      <Heads currency={currency} state={state} setState={setState} />
      <tbody ref={body} className="relative block" style={{ height: virtual.getTotalSize() }} onKeyDown={onKeyDown}>
        {items.map(({ index, start }) => {
          const row = rows[index];
          return row ? (
            <MaterialLine
              key={row.id}
              row={row}
              index={index}
              facets={facets}
              currency={currency}
              style={{ height: ROW_PX, transform: `translateY(${start - top}px)` }}
            />
          ) : null;
        })}
      </tbody>
    </table>
  );
}

function rowAt(target: EventTarget): number | null {
  const row = (target as HTMLElement).closest<HTMLElement>('[data-row]');
  return row ? Number(row.dataset.row) : null;
}

/** How far down the page it begins; what stands above it may grow and shrink. */
function useTopOf(element: RefObject<HTMLElement | null>): number {
  const [top, setTop] = useState(0);
  useLayoutEffect(() => {
    const now = element.current ? Math.round(element.current.getBoundingClientRect().top + window.scrollY) : 0;
    if (now !== top) setTop(now);
  });
  return top;
}

const HEADS: readonly { sort: MaterialSort | null; words: string; numeric?: boolean; costs?: boolean; at?: string }[] =
  [
    { sort: 'name', words: 'Name' },
    { sort: null, words: 'Smells of', at: 'max-lg:hidden' },
    { sort: 'natural', words: 'Natural', numeric: true, at: 'max-xl:hidden' },
    { sort: 'strength', words: 'Strength', numeric: true, at: 'max-md:hidden' },
    { sort: 'price', words: 'Per kg', numeric: true, costs: true },
    { sort: 'equal', words: 'Equal strength', numeric: true, costs: true, at: 'max-md:hidden' },
  ];

function Heads({ currency, state, setState }: Pick<MaterialTableProps, 'currency' | 'state' | 'setState'>) {
  return (
    <thead className="sticky top-0 z-20 block border-b border-ink bg-paper">
      <tr className={classNames(GRID(currency), 'narrow h-9 text-ink-soft')}>
        {HEADS.filter(({ costs }) => !costs || currency).map(({ sort, words, numeric, at }) => {
          const active = sort === state.sort;
          const order = active ? (state.order ?? FIRST_ORDER[state.sort]) : null;
          const direction = order && (order === 'asc' ? 'ascending' : 'descending');
          return (
            <th
              key={words}
              scope="col"
              aria-sort={direction ?? undefined}
              colSpan={words === 'Name' ? 2 : undefined}
              className={classNames(
                'font-[560]',
                numeric ? 'text-right' : 'text-left',
                words === 'Name' && 'col-span-2',
                at,
              )}
            >
              {sort ? (
                <button
                  type="button"
                  className={classNames(
                    'inline-flex min-h-8 items-center gap-1 font-[560] hover:text-ink',
                    active && 'text-ink',
                  )}
                  onClick={() =>
                    setState({ sort, order: active ? (order === 'asc' ? 'desc' : 'asc') : FIRST_ORDER[sort] })
                  }
                >
                  {words}
                  <SortArrow direction={direction} />
                </button>
              ) : (
                words
              )}
            </th>
          );
        })}
      </tr>
    </thead>
  );
}
