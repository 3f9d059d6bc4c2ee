// Two to four views of one thing, one open at a time; arrow keys move between them.
import { Tabs as RadixTabs } from 'radix-ui';
import type { ReactNode } from 'react';

export interface Tab {
  readonly value: string;
  readonly label: ReactNode;
  readonly content: ReactNode;
}

interface TabsProps {
  /** What the tabs choose: "How to find a core". */
  readonly label: string;
  readonly tabs: readonly Tab[];
  readonly value: string;
  readonly onChange: (value: string) => void;
}

export function Tabs({ label, tabs, value, onChange }: TabsProps) {
  return (
    <RadixTabs.Root value={value} onValueChange={onChange}>
      <RadixTabs.List className="tabs" aria-label={label}>
        {tabs.map((tab) => (
          <RadixTabs.Trigger key={tab.value} className="tab" value={tab.value}>
            {tab.label}
          </RadixTabs.Trigger>
        ))}
      </RadixTabs.List>
      {tabs.map((tab) => (
        <RadixTabs.Content key={tab.value} value={tab.value}>
          {tab.content}
        </RadixTabs.Content>
      ))}
    </RadixTabs.Root>
  );
}
