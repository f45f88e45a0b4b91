import type { ReactNode } from 'react';
import { useId } from 'react';
import { Icon } from './Icon.tsx';
import './controls.css';

interface GroupProps {
  readonly title: string;
  readonly folded: boolean;
  readonly onFold: (folded: boolean) => void;
  /** Stands at the right end of the heading. */
  readonly aside?: ReactNode;
  readonly children: ReactNode;
}

/** A titled part of a panel that folds away; what is folded is not rendered. */
export function Group({ title, folded, onFold, aside, children }: GroupProps) {
  const id = useId();
  return (
    <section className="group" aria-labelledby={`${id}-title`}>
      <div className="group-head">
        <h3 className="group-title" id={`${id}-title`}>
          <button
            type="button"
            className="group-button"
            aria-expanded={!folded}
            aria-controls={folded ? undefined : `${id}-body`}
            onClick={() => onFold(!folded)}
          >
            {title}
            <span className={folded ? 'group-mark' : 'group-mark group-mark-open'}>
              <Icon name="fold" size={12} />
            </span>
          </button>
        </h3>
        {aside}
      </div>
      {!folded && (
        <div className="group-body" id={`${id}-body`}>
          {children}
        </div>
      )}
    </section>
  );
}
