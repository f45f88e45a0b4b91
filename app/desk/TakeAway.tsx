import type { PartId, Refusal, SpacingTable } from '../../engine/index.ts';
import { SHEET_FORMS, sheetText } from '../../engine/index.ts';
import { Icon } from '../ui/Icon.tsx';
import type { ClipboardHost } from './clipboard.ts';
import { copyText } from './clipboard.ts';
import { downloadTable, FORM_FILES } from './exports.ts';
import type { FileHost } from './files.ts';

interface TakeAwayProps {
  /** Null when the layout cannot be built; then nothing can be taken away. */
  readonly table: SpacingTable | null;
  /** Id of the element that says why not. */
  readonly whyNot: string;
  readonly clipboard: ClipboardHost;
  readonly download: FileHost['download'];
  readonly downloadDrawing: (kind: 'SVG' | 'PNG') => void;
  readonly print: () => void;
}

const DRAWINGS = ['SVG', 'PNG'] as const;

/** Copy and download of every text form of the table, download of the drawing, and print. */
export function TakeAway(props: TakeAwayProps) {
  const { table, whyNot, clipboard, download, downloadDrawing, print } = props;
  const refused = table === null ? { disabled: true, 'aria-describedby': whyNot } : {};
  return (
    <div className="take-away">
      <ul className="take-away-forms">
        {SHEET_FORMS.map((form) => {
          const { label } = FORM_FILES[form];
          return (
            <li key={form} className="take-away-form">
              <span className="take-away-name">{label}</span>
              <button
                type="button"
                className="icon-button"
                aria-label={`Copy as ${label}`}
                {...refused}
                onClick={() =>
                  table && void copyText(clipboard, sheetText(table, form), 'The spacing table is')
                }
              >
                <Icon name="copy" />
              </button>
              <button
                type="button"
                className="icon-button"
                aria-label={`Download as ${label}`}
                {...refused}
                onClick={() => table && downloadTable(download, table, form)}
              >
                <Icon name="save" />
              </button>
            </li>
          );
        })}
        {DRAWINGS.map((kind) => (
          <li key={kind} className="take-away-form">
            <span className="take-away-name">{kind} drawing</span>
            <button
              type="button"
              className="icon-button"
              aria-label={`Download the drawing as ${kind}`}
              {...refused}
              onClick={() => downloadDrawing(kind)}
            >
              <Icon name="save" />
            </button>
          </li>
        ))}
      </ul>
      <button type="button" className="main-button" {...refused} onClick={print}>
        Print
      </button>
    </div>
  );
}

interface RefusalsProps {
  readonly id: string;
  readonly refusals: readonly Refusal[];
  readonly onShow: (partId: PartId) => void;
}

/** Why no sheet is given: everything that cannot be built, each with the way to it. */
export function Refusals({ id, refusals, onShow }: RefusalsProps) {
  return (
    <section className="hand-over-refused" id={id} aria-label="Why nothing can be handed over">
      <p>This layout cannot be built as it is, so there is no sheet yet:</p>
      <ul>
        {refusals.map(({ partId, positionId, sentence }) => (
          <li key={`${partId} ${positionId} ${sentence}`}>
            {sentence}{' '}
            {partId && (
              <button type="button" className="text-button" onClick={() => onShow(partId)}>
                Show it
              </button>
            )}
          </li>
        ))}
      </ul>
    </section>
  );
}
