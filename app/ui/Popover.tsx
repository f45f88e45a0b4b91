import type { ReactNode, ToggleEvent } from 'react';
import { useId, useRef, useState } from 'react';
import './dialog.css';

interface PopoverProps {
  /** What the button shows. */
  readonly button: ReactNode;
  /** Names the button and what it opens. */
  readonly label: string;
  readonly className?: string;
  /** Rendered only while open; `close` shuts it. */
  readonly children: (close: () => void) => ReactNode;
}

const MARGIN_PX = 8;

/** A button that opens a small area under itself, by the platform's popover: Escape and a press elsewhere close it. */
export function Popover({ button, label, className = 'icon-button', children }: PopoverProps) {
  const id = useId();
  const opener = useRef<HTMLButtonElement>(null);
  const area = useRef<HTMLDivElement>(null);
  const [open, setOpen] = useState(false);

  const onBeforeToggle = (event: ToggleEvent) => {
    if (event.newState === 'open') setOpen(true);
  };

  const onToggle = (event: ToggleEvent) => {
    const shown = event.newState === 'open';
    if (shown && opener.current && area.current) placeUnder(opener.current, area.current);
    setOpen(shown);
  };

  return (
    <>
      <button
        ref={opener}
        type="button"
        className={className}
        popoverTarget={id}
        aria-label={label}
        aria-expanded={open}
      >
        {button}
      </button>
      <div
        ref={area}
        id={id}
        popover="auto"
        className="popover"
        role="dialog"
        aria-label={label}
        onBeforeToggle={onBeforeToggle}
        onToggle={onToggle}
      >
        {open && children(() => area.current?.hidePopover())}
      </div>
    </>
  );
}

function placeUnder(opener: HTMLElement, area: HTMLElement): void {
  const at = opener.getBoundingClientRect();
  const left = Math.min(at.left, window.innerWidth - area.offsetWidth - MARGIN_PX);
  const below = at.bottom + 4;
  const above = at.top - 4 - area.offsetHeight;
  const fits = below + area.offsetHeight <= window.innerHeight - MARGIN_PX;
  area.style.left = `${Math.max(MARGIN_PX, left)}px`;
  area.style.top = `${fits ? below : Math.max(MARGIN_PX, above)}px`;
}
