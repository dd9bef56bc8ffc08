'use client';

import type { ReactNode } from 'react';
import { Tabs as AriaTabs, Tab, TabList, TabPanel } from 'react-aria-components/Tabs';

export interface TabsProps<T extends string> {
  label: string;
  tabs: readonly { id: T; label: ReactNode; panel: ReactNode }[];
  selected?: T;
  onSelect?: (id: T) => void;
}

/** Index tabs on a rule; the chosen one stands open towards its panel. */
export function Tabs<T extends string>({ label, tabs, selected, onSelect }: TabsProps<T>) {
  return (
    <AriaTabs selectedKey={selected} onSelectionChange={(key) => onSelect?.(key as T)}>
      <TabList aria-label={label} className="flex gap-1 overflow-x-auto border-b border-ink px-1">
        {tabs.map((tab) => (
          <Tab
            key={tab.id}
            id={tab.id}
            className="-mb-px grid min-h-10 place-items-center rounded-t-tile border border-transparent px-4 whitespace-nowrap text-ink-soft hover:text-ink data-[focus-visible]:outline-offset-[-4px] data-[selected]:border-ink data-[selected]:border-b-paper data-[selected]:bg-paper data-[selected]:font-[560] data-[selected]:text-ink"
          >
            {tab.label}
          </Tab>
        ))}
      </TabList>
      {tabs.map((tab) => (
        <TabPanel key={tab.id} id={tab.id} className="pt-5">
          {tab.panel}
        </TabPanel>
      ))}
    </AriaTabs>
  );
}
