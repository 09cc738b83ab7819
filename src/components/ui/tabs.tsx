import type { ReactNode } from 'react';
import { Tabs as Radix } from 'radix-ui';

interface TabsProps {
  label: string;
  value: string;
  onValueChange: (value: string) => void;
  tabs: readonly { value: string; label: ReactNode }[];
  /** `TabPanel`s. */
  children: ReactNode;
}

/** Two or more views of one place, one shown at a time. */
export function Tabs({ label, value, onValueChange, tabs, children }: TabsProps) {
  return (
    <Radix.Root value={value} onValueChange={onValueChange}>
      <Radix.List aria-label={label} className="flex gap-1 overflow-x-auto border-b border-line">
        {tabs.map((tab) => (
          <Radix.Trigger
            key={tab.value}
            value={tab.value}
            className="min-h-11 shrink-0 border-b-3 border-transparent px-3 py-2 font-semibold text-ink-soft hover:text-ink data-[state=active]:border-teal data-[state=active]:text-ink"
          >
            {tab.label}
          </Radix.Trigger>
        ))}
      </Radix.List>
      {children}
    </Radix.Root>
  );
}

/** What one tab shows. */
export function TabPanel({ value, children }: { value: string; children: ReactNode }) {
  return (
    <Radix.Content value={value} className="pt-5">
      {children}
    </Radix.Content>
  );
}
