'use client';

import { useVirtualizer } from '@tanstack/react-virtual';
import { type KeyboardEvent, type ReactNode, useEffect, useId, useMemo, useRef, useState } from 'react';
import { fuzzyFilter } from '@/lib/shared/fuzzy';
import { classNames } from './class-names';
import { FieldFrame, type FieldWords, inputClasses } from './field';

export interface ComboboxItem {
  id: string;
  label: string;
  /** Searched as well and shown softly, e.g. the botanical name. */
  detail?: string;
}

export interface ComboboxProps<T extends ComboboxItem> extends FieldWords {
  items: readonly T[];
  value: string | null;
  onChange: (id: string | null) => void;
  /** What stands before the name, e.g. a strip of size `node`. */
  lead?: (item: T) => ReactNode;
  placeholder?: string;
  /** After a choice the field empties itself, for adding one thing after another. */
  picksMany?: boolean;
  disabled?: boolean;
  className?: string;
}

const ROW_HEIGHT = 44;

/**
 * A field that finds one of many by any of its letters. By hand after the WAI-ARIA combobox pattern rather than from
 * the widget library, whose own costs 66 kB and filters before it virtualises; thousands of items stay quick.
 */
export function Combobox<T extends ComboboxItem>(props: ComboboxProps<T>) {
  const { items, value, onChange, lead, placeholder, picksMany, disabled, className, label, hint, error } = props;
  const id = useId();
  const chosen = items.find((item) => item.id === value);
  const [query, setQuery] = useState<string | null>(null);
  const [open, setOpen] = useState(false);
  const [active, setActive] = useState(0);
  const found = useMemo(
    () => fuzzyFilter(query ?? '', items, (item) => `${item.label} ${item.detail ?? ''}`),
    [query, items],
  );

  function close() {
    setOpen(false);
    setQuery(null);
  }
  function choose(item: T | undefined) {
    if (!item) return;
    onChange(item.id);
    setQuery(picksMany ? '' : null);
    setOpen(Boolean(picksMany));
    setActive(0);
  }
  function onKeyDown(event: KeyboardEvent) {
    const page = 8;
    const moves: Record<string, number> = { ArrowDown: 1, ArrowUp: -1, PageDown: page, PageUp: -page };
    const by = moves[event.key];
    if (by !== undefined) {
      event.preventDefault();
      if (!open) setOpen(true);
      else setActive((index) => Math.max(0, Math.min(found.length - 1, index + by)));
    } else if (event.key === 'Enter' && open) {
      event.preventDefault();
      choose(found[active]);
    } else if (event.key === 'Escape' && open) {
      event.stopPropagation();
      close();
    }
  }

  return (
    <FieldFrame id={id} label={label} hint={hint} error={error} className={className}>
      <div className="relative">
        <input
          id={id}
          role="combobox"
          aria-expanded={open}
          aria-controls={`${id}-list`}
          aria-autocomplete="list"
          aria-activedescendant={open && found[active] ? `${id}-${active}` : undefined}
          aria-invalid={error ? true : undefined}
          aria-describedby={error || hint ? `${id}-note` : undefined}
          autoComplete="off"
          spellCheck={false}
          disabled={disabled}
          placeholder={placeholder}
          value={query ?? chosen?.label ?? ''}
          className={classNames(inputClasses, 'pr-9')}
          onFocus={(event) => event.target.select()}
          onClick={() => setOpen(true)}
          onChange={(event) => {
            setQuery(event.target.value);
            setActive(0);
            setOpen(true);
          }}
          onKeyDown={onKeyDown}
          onBlur={close}
        />
        <svg
          viewBox="0 0 12 12"
          width="12"
          height="12"
          aria-hidden="true"
          className="pointer-events-none absolute top-1/2 right-3 -translate-y-1/2 text-ink-soft"
        >
          <path d="M8 8l3 3M5 9a4 4 0 1 1 .01 0Z" fill="none" stroke="currentColor" strokeWidth="1.3" />
        </svg>
        {open ? (
          <Hits id={id} found={found} active={active} value={value} lead={lead} onPick={choose} label={label} />
        ) : null}
      </div>
    </FieldFrame>
  );
}

interface HitsProps<T extends ComboboxItem> {
  id: string;
  found: readonly T[];
  active: number;
  value: string | null;
  lead?: (item: T) => ReactNode;
  onPick: (item: T) => void;
  label: ReactNode;
}

function Hits<T extends ComboboxItem>({ id, found, active, value, lead, onPick, label }: HitsProps<T>) {
  const scroller = useRef<HTMLDivElement>(null);
  const rows = useVirtualizer({
    count: found.length,
    getScrollElement: () => scroller.current,
    estimateSize: () => ROW_HEIGHT,
    overscan: 6,
  });
  useEffect(() => rows.scrollToIndex(active), [rows, active]);
  return (
    <div
      ref={scroller}
      className="absolute inset-x-0 top-full z-40 mt-1 max-h-80 overflow-auto rounded-tile border border-ink bg-paper shadow-lift"
    >
      {found.length === 0 ? <p className="p-3 text-ink-soft">Nothing by that name.</p> : null}
      <div
        id={`${id}-list`}
        role="listbox"
        aria-label={typeof label === 'string' ? label : 'Choices'}
        tabIndex={-1}
        className="relative"
        style={{ height: rows.getTotalSize() }}
      >
        {rows.getVirtualItems().map(({ index, start }) => {
          const item = found[index];
          return item ? (
            <div
              key={item.id}
              id={`${id}-${index}`}
              role="option"
              tabIndex={-1}
              aria-selected={item.id === value}
              aria-setsize={found.length}
              aria-posinset={index + 1}
              className={classNames(
                'absolute inset-x-0 flex items-center gap-3 px-3',
                index === active ? 'bg-pressed' : 'hover:bg-wash',
                item.id === value && 'font-[600]',
              )}
              style={{ height: ROW_HEIGHT, transform: `translateY(${start}px)` }}
              onMouseDown={(event) => {
                // The field keeps the focus; the blur would close the list before the click came.
                event.preventDefault();
                onPick(item);
              }}
            >
              {lead?.(item)}
              <span className="min-w-0">
                <span className="block truncate">{item.label}</span>
                {item.detail ? <span className="block truncate text-note text-ink-soft">{item.detail}</span> : null}
              </span>
            </div>
          ) : null;
        })}
      </div>
    </div>
  );
}
