'use client';

import { useVirtualizer } from '@tanstack/react-virtual';
import { useMemo, useRef } from 'react';
import { Strip } from '@/app/_components/strip/strip';
import { classNames } from '@/app/_components/ui/class-names';
import { SortArrow, Td, Th } from '@/app/_components/ui/table';
import type { RelatedMap } from '@/lib/shared/related';
import { useMapState } from '../_client/map-state';
import type { MapView } from '../_client/model';
import { type TableRow, tableRows } from '../_client/table-rows';

const ROW_HEIGHT = 56;
const likeness = new Intl.NumberFormat('en-GB', { minimumFractionDigits: 2, maximumFractionDigits: 2 });

interface MapTableProps {
  map: RelatedMap;
  view: MapView;
  onSelect: (id: string) => void;
}

/** The map as a table: the same filters, the same address, the same selection; only the rows in sight are drawn. */
export function MapTable({ map, view, onSelect }: MapTableProps) {
  const [{ sort }, setState] = useMapState();
  const rows = useMemo(() => tableRows(view, sort), [view, sort]);
  const scroller = useRef<HTMLDivElement>(null);
  const virtual = useVirtualizer({
    count: rows.length,
    getScrollElement: () => scroller.current,
    estimateSize: () => ROW_HEIGHT,
    overscan: 12,
    initialRect: { width: 800, height: 900 },
  });
  const shown = virtual.getVirtualItems();
  const above = shown[0]?.start ?? 0;
  const below = virtual.getTotalSize() - (shown.at(-1)?.end ?? 0);
  const columns = 5 + view.chosen.length;
  const head = (key: string, label: string, numeric = false) => (
    <SortHead key={key} {...{ label, numeric, sort }} name={key} onSort={(next) => setState({ sort: next })} />
  );
  return (
    <section
      ref={scroller}
      aria-label="The map as a table"
      // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must be scrollable by keys
      tabIndex={0}
      className="h-[70dvh] min-h-[26rem] overflow-auto focus-visible:outline-offset-[-2px] md:h-[calc(100dvh-13rem)]"
    >
      <table className="w-full border-collapse text-left" aria-rowcount={rows.length + 1}>
        <thead className="sticky top-0 z-10 bg-paper">
          <tr aria-rowindex={1}>
            {head('name', 'Material')}
            {head('kind', 'Kind')}
            {view.chosen.map(({ slug, name }) => head(slug, name, true))}
            {head('links', 'Links', true)}
            {head('closest', 'Closest to')}
            {head('likeness', 'Alike', true)}
          </tr>
        </thead>
        <tbody>
          <Gap height={above} columns={columns} />
          {shown.map(({ index }) => {
            const row = rows[index];
            return row ? (
              <tr
                key={row.material.id}
                ref={virtual.measureElement}
                data-index={index}
                aria-rowindex={index + 2}
                className={classNames('h-14 hover:bg-wash', row.material.id === view.selected?.id && 'bg-wash')}
              >
                <Cells row={row} map={map} onSelect={onSelect} />
              </tr>
            ) : null;
          })}
          <Gap height={below} columns={columns} />
        </tbody>
      </table>
      {rows.length === 0 ? <p className="p-5">No material fits. Take a filter or a facet away.</p> : null}
    </section>
  );
}

function Cells({ row, map, onSelect }: { row: TableRow; map: RelatedMap; onSelect: (id: string) => void }) {
  const { material, intensities, links, closest } = row;
  const { id, name, kind, profile, phases } = material;
  return (
    <>
      <th scope="row" className="border-b border-grout py-1.5 pr-3 pl-5 text-left font-normal">
        <span className="flex items-center gap-3">
          <Strip size="table" facets={map.facets} profile={profile} phases={phases} />
          <button type="button" className="min-h-8 text-left font-[560] hover:underline" onClick={() => onSelect(id)}>
            {name}
          </button>
        </span>
      </th>
      <Td>{kind}</Td>
      {intensities.map((intensity, at) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: a column is its place
        <Td numeric key={at}>
          {intensity}
        </Td>
      ))}
      <Td numeric>{links}</Td>
      <Td>{closest?.name ?? <span className="text-ink-soft">nobody</span>}</Td>
      <Td numeric>{closest ? likeness.format(closest.similarity) : ''}</Td>
    </>
  );
}

function Gap({ height, columns }: { height: number; columns: number }) {
  return height > 0 ? (
    // biome-ignore lint/a11y/noAriaHiddenOnFocusable: an empty row, as tall as those out of sight
    <tr aria-hidden="true">
      <td colSpan={columns} style={{ height }} />
    </tr>
  ) : null;
}

interface SortHeadProps {
  name: string;
  label: string;
  numeric: boolean;
  sort: string;
  onSort: (sort: string) => void;
}

/** `-links` sorts from most to least; a column of numbers begins with the most. */
function SortHead({ name, label, numeric, sort, onSort }: SortHeadProps) {
  const direction = sort === name ? 'ascending' : sort === `-${name}` ? 'descending' : null;
  const first = numeric ? `-${name}` : name;
  const other = numeric ? name : `-${name}`;
  return (
    <Th numeric={numeric} aria-sort={direction ?? undefined}>
      <button
        type="button"
        className="inline-flex min-h-8 items-center gap-1 hover:text-ink"
        onClick={() => onSort(sort === first ? other : first)}
      >
        {label}
        <SortArrow direction={direction} />
      </button>
    </Th>
  );
}
