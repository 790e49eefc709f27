import { Tabs as Radix } from 'radix-ui';
import { memo } from 'react';
import type { ReactNode } from 'react';

type TabsProps<Value extends string> = {
  /** Names the row of tabs for screen readers. */
  label: string;
  value: Value;
  onValueChange: (value: Value) => void;
  tabs: readonly { value: Value; label: string }[];
  /** Stands at the right end of the row, such as the primary button. */
  end?: ReactNode;
  /** The panel of the chosen tab. */
  children: ReactNode;
};

/** One panel under a row of soft tabs; arrows move between them. */
export function Tabs<Value extends string>({
  label,
  value,
  onValueChange,
  tabs,
  end,
  children,
}: TabsProps<Value>) {
  return (
    <Radix.Root
      value={value}
      onValueChange={(chosen) => {
        const tab = tabs.find((candidate) => candidate.value === chosen);
        if (tab) onValueChange(tab.value);
      }}
    >
      <div className="flex flex-wrap items-center gap-x-3 gap-y-2">
        <TabRow label={label} tabs={tabs} />
        {end ? <div className="ml-auto flex items-center gap-3">{end}</div> : null}
      </div>
      <Radix.Content value={value} className="outline-offset-4">
        {children}
      </Radix.Content>
    </Radix.Root>
  );
}

/** Apart from the panel, which on some pages is drawn at every step of a drag. */
const TabRow = memo(function TabRow({ label, tabs }: Pick<TabsProps<string>, 'label' | 'tabs'>) {
  return (
    <Radix.List aria-label={label} className="flex flex-wrap gap-1">
      {tabs.map((tab) => (
        <Radix.Trigger
          key={tab.value}
          value={tab.value}
          className="rounded-control px-3 py-[5px] text-muted hover:text-ink data-[state=active]:bg-accent-soft data-[state=active]:font-semibold data-[state=active]:text-accent"
        >
          {tab.label}
        </Radix.Trigger>
      ))}
    </Radix.List>
  );
});
