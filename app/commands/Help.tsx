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
          {GESTURES.map((group) => (
            <table key={group.title} className="help-table">
              <caption>{group.title}</caption>
              <thead className="visually-hidden">
                <tr>
                  <th scope="col">What it does</th>
                  <th scope="col">By hand</th>
                  <th scope="col">By keys</th>
                </tr>
              </thead>
              <tbody>
                {group.gestures.map((gesture) => (
                  <tr key={gesture.does}>
                    <th scope="row">{gesture.does}</th>
                    <td>{gesture.hand}</td>
                    <td>{keyWords(gesture.keys, apple)}</td>
                  </tr>
                ))}
              </tbody>
            </table>
          ))}
        </section>
        <section aria-labelledby="help-commands">
          <h3 id="help-commands" className="help-title">
            Commands
          </h3>
          <div className="help-columns">
            {groups.map((group) => (
              <table key={group.title} className="help-table help-commands">
                <caption>{group.title}</caption>
                <thead className="visually-hidden">
                  <tr>
                    <th scope="col">Command</th>
                    <th scope="col">Keys</th>
                  </tr>
                </thead>
                <tbody>
                  {group.commands.map((command) => (
                    <tr key={command.id}>
                      <th scope="row">{command.label}</th>
                      <td>
                        {command.keys.map((key) => (
                          <kbd key={key}>{keyWords(key, apple)}</kbd>
                        ))}
                      </td>
                    </tr>
                  ))}
                </tbody>
              </table>
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
