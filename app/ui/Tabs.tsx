import type { KeyboardEvent, ReactNode } from 'react';
import { useId, useRef } from 'react';
import './controls.css';

interface Tab<Id extends string> {
  readonly id: Id;
  readonly label: string;
}

interface TabsProps<Id extends string> {
  /** Names the row of tabs for a screen reader. */
  readonly label: string;
  readonly tabs: readonly Tab<Id>[];
  /** Null: all are closed and no panel is shown. */
  readonly selected: Id | null;
  readonly onSelect: (id: Id) => void;
  /** Stands at the right end of the row. */
  readonly aside?: ReactNode;
  readonly children?: ReactNode;
}

/** Tabs over one panel. One tab stop; the arrow keys, Home and End move and select. */
export function Tabs<Id extends string>(props: TabsProps<Id>) {
  const { label, tabs, selected, onSelect, aside, children } = props;
  const base = useId();
  const list = useRef<HTMLDivElement>(null);
  const current = Math.max(
    0,
    tabs.findIndex((tab) => tab.id === selected),
  );

  const go = (index: number) => {
    const tab = tabs[(index + tabs.length) % tabs.length];
    if (!tab) return;
    onSelect(tab.id);
    list.current?.querySelector<HTMLElement>(`[data-tab="${tab.id}"]`)?.focus();
  };

  const onKeyDown = (event: KeyboardEvent) => {
    const moves: Readonly<Record<string, number>> = {
      ArrowLeft: current - 1,
      ArrowRight: current + 1,
      Home: 0,
      End: tabs.length - 1,
    };
    const target = moves[event.key];
    if (target === undefined) return;
    event.preventDefault();
    go(target);
  };

  return (
    <div className="tabs">
      <div className="tabs-row">
        <div ref={list} className="tabs-list" role="tablist" aria-label={label} onKeyDown={onKeyDown}>
          {tabs.map((tab, index) => (
            <button
              key={tab.id}
              type="button"
              role="tab"
              className="tabs-tab"
              id={`${base}-${tab.id}`}
              data-tab={tab.id}
              aria-selected={tab.id === selected}
              aria-controls={tab.id === selected ? `${base}-panel` : undefined}
              tabIndex={index === current ? 0 : -1}
              onClick={() => onSelect(tab.id)}
            >
              {tab.label}
            </button>
          ))}
        </div>
        {aside}
      </div>
      {selected !== null && (
        <div
          className="tabs-panel"
          role="tabpanel"
          id={`${base}-panel`}
          aria-labelledby={`${base}-${selected}`}
        >
          {children}
        </div>
      )}
    </div>
  );
}
