import type { KeyboardEvent, MouseEvent, ReactNode } from 'react';
import { useId, useLayoutEffect, useRef } from 'react';
import { Icon } from './Icon.tsx';
import './dialog.css';

interface SheetDialogProps {
  readonly title: string;
  readonly onClose: () => void;
  /** `page` lies over everything and takes the focus; `below` rises from the lower edge and leaves the rest usable. */
  readonly place?: 'page' | 'below';
  /** Stands beside the title. */
  readonly aside?: ReactNode;
  readonly children: ReactNode;
}

/** A sheet over the page, open as long as it is rendered. Escape, its button and a press beside it close it. */
export function SheetDialog({ title, onClose, place = 'page', aside, children }: SheetDialogProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const id = useId();

  // Closed before it leaves the page, so that the browser gives the focus back.
  useLayoutEffect(() => {
    const element = dialog.current;
    if (!element || element.open) return;
    if (place === 'page') element.showModal();
    else element.show();
    return () => element.close();
  }, [place]);

  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key !== 'Escape' || event.defaultPrevented) return;
    event.preventDefault();
    event.stopPropagation();
    onClose();
  };

  const onPress = (event: MouseEvent) => {
    if (place === 'page' && event.target === dialog.current) onClose();
  };

  return (
    <dialog
      ref={dialog}
      className={place === 'page' ? 'sheet-dialog' : 'sheet-dialog sheet-dialog-below'}
      aria-labelledby={id}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onKeyDown={onKeyDown}
      onClick={onPress}
    >
      <div className="sheet-dialog-body">
        <div className="sheet-dialog-head">
          <h2 id={id} className="sheet-dialog-title">
            {title}
          </h2>
          {aside}
          <button type="button" className="icon-button" aria-label={`Close ${title}`} onClick={onClose}>
            <Icon name="close" />
          </button>
        </div>
        <div className="sheet-dialog-content">{children}</div>
      </div>
    </dialog>
  );
}
