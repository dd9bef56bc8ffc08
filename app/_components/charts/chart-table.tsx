import type { ReactNode } from 'react';

export interface ChartTableProps {
  caption: string;
  head: readonly string[];
  /** The first cell names the row. */
  rows: readonly (readonly ReactNode[])[];
}

/** The same numbers as the drawing above it, for those who would rather read them. */
export function ChartTable({ caption, head, rows }: ChartTableProps) {
  return (
    <details className="group mt-3" data-print="no">
      <summary className="inline-flex min-h-6 list-none items-center gap-1.5 text-ink-soft underline decoration-rule underline-offset-4 hover:text-ink">
        <span className="group-open:hidden">Show as a table</span>
        <span className="hidden group-open:inline">Hide the table</span>
      </summary>
      {/* biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must be scrollable by keys */}
      <section className="mt-2 max-h-80 overflow-auto" tabIndex={0} aria-label={caption}>
        <table className="w-full border-collapse text-left">
          <caption className="sr-only">{caption}</caption>
          <thead>
            <tr>
              {head.map((word, column) => (
                <th key={word} scope="col" className={column ? 'px-2 text-right font-[560]' : 'pr-2 font-[560]'}>
                  {word}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map(([name, ...cells], row) => (
              // biome-ignore lint/suspicious/noArrayIndexKey: rows are drawn whole and never reordered in place
              <tr key={row} className="border-t border-grout">
                <th scope="row" className="py-1 pr-2 text-left font-normal">
                  {name}
                </th>
                {cells.map((cell, column) => (
                  <td key={head[column + 1] ?? column} className="figures px-2 text-right">
                    {cell}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </section>
    </details>
  );
}
