import type { ReactNode } from 'react';
import { version } from '../../package.json';
import { SheetDialog } from '../ui/SheetDialog.tsx';
import { GESTURES } from './gestures.ts';
import { keyWords } from './keyWords.ts';
import type { CommandGroup } from './services.ts';
import './help.css';

interface HelpProps {
  readonly groups: readonly CommandGroup[];
  /** Whether this is a machine with ⌘ instead of Ctrl. */
  readonly apple: boolean;
  readonly onClose: () => void;
}

/** Every key and gesture, the caution about concentrated light, version and licence. */
export function Help({ groups, apple, onClose }: HelpProps) {
  return (
    <SheetDialog title="Help" onClose={onClose}>
      {/* biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must be reachable by keyboard (WCAG 2.1.1) */}
      <section className="help" tabIndex={0} aria-label="Keys and gestures">
        <p className="help-lead">
          Drag parts along the axis, click a dimension and type, and read the numbers beside it. Letters act
          while the drawing has the focus: click it, or reach it by Tab.
        </p>
        <section aria-labelledby="help-gestures">
          <h3 id="help-gestures" className="help-title">
            By hand and by keys
          </h3>
          {GESTURES.map(({ title, gestures }) => (
            <HelpTable
              key={title}
              title={title}
              heads={['What it does', 'By hand', 'By keys']}
              rows={gestures.map(({ does, hand, keys }) => [does, hand, keyWords(keys, apple)])}
            />
          ))}
        </section>
        <section aria-labelledby="help-commands">
          <h3 id="help-commands" className="help-title">
            Commands
          </h3>
          <div className="help-columns">
            {groups.map(({ title, commands }) => (
              <HelpTable
                key={title}
                title={title}
                heads={['Command', 'Keys']}
                rows={commands.map(({ label, keys }) => [
                  label,
                  keys.map((key) => <kbd key={key}>{keyWords(key, apple)}</kbd>),
                ])}
              />
            ))}
          </div>
        </section>
        <section aria-labelledby="help-caution">
          <h3 id="help-caution" className="help-title">
            Safety
          </h3>
          <p>
            A layout that takes collimated light concentrates it. Sunlight or a laser beam that enters it can
            burn eyes, skin and material: never look through a layout at the sun or into a beam, and assess
            the hazard by IEC 60825-1 before anything is built.
          </p>
        </section>
        <p className="help-foot">
          Gapwright {version}, MIT licence. Sketches stay in this browser and in your own files.
        </p>
      </section>
    </SheetDialog>
  );
}

interface HelpTableProps {
  readonly title: string;
  /** For those who hear the table. */
  readonly heads: readonly string[];
  /** The first cell of a row says what the others do. */
  readonly rows: readonly (readonly [does: string, ...ways: ReactNode[]])[];
}

function HelpTable({ title, heads, rows }: HelpTableProps) {
  return (
    <table className="help-table">
      <caption>{title}</caption>
      <thead className="visually-hidden">
        <tr>
          {heads.map((head) => (
            <th key={head} scope="col">
              {head}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map(([does, ...ways]) => (
          <tr key={does}>
            <th scope="row">{does}</th>
            {ways.map((way, index) => (
              <td key={heads[index + 1]}>{way}</td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
