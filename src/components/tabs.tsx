// Index dividers: between pages (links) and within a page.
import { Tabs as Radix } from 'radix-ui';
import type { ReactNode } from 'react';
import { NavLink } from 'react-router-dom';

export interface IndexTab {
  readonly to: string;
  readonly label: string;
  /** A figure beside the label. */
  readonly count?: number;
}

/** Dividers that are links to pages of one thing. */
export function IndexTabs({ label, tabs }: { readonly label: string; readonly tabs: readonly IndexTab[] }) {
  return (
    <nav aria-label={label} className="flex flex-wrap gap-1 border-b-2 border-strong">
      {tabs.map((tab) => (
        <NavLink key={tab.to} to={tab.to} end className="tab cut">
          {tab.label}
          {tab.count !== undefined && <span className="figures font-normal">{tab.count}</span>}
        </NavLink>
      ))}
    </nav>
  );
}

export interface TabPanel<T extends string> {
  readonly value: T;
  readonly label: string;
  readonly content: ReactNode;
}

export interface TabsProps<T extends string> {
  readonly label: string;
  readonly value: T;
  readonly onChange: (value: T) => void;
  readonly panels: readonly TabPanel<T>[];
}

/** Dividers within a page. */
export function Tabs<T extends string>({ label, value, onChange, panels }: TabsProps<T>) {
  return (
    <Radix.Root value={value} onValueChange={(next) => onChange(next as T)} activationMode="manual">
      <Radix.List aria-label={label} className="flex flex-wrap gap-1 border-b-2 border-strong">
        {panels.map((panel) => (
          <Radix.Trigger key={panel.value} value={panel.value} className="tab cut">
            {panel.label}
          </Radix.Trigger>
        ))}
      </Radix.List>
      {panels.map((panel) => (
        <Radix.Content key={panel.value} value={panel.value} className="pt-4">
          {panel.content}
        </Radix.Content>
      ))}
    </Radix.Root>
  );
}
