import { useId, useMemo } from 'react';
import { cautionOf, spacingTable } from '../../engine/index.ts';
import { useReading } from '../live/reading.ts';
import { select } from '../store/viewStore.ts';
import { SheetDialog } from '../ui/SheetDialog.tsx';
import { withCaution } from './cautioned.ts';
import type { ClipboardHost } from './clipboard.ts';
import { downloadPng, downloadSvg } from './exports.ts';
import type { FileHost } from './files.ts';
import { InlineSvg } from './InlineSvg.tsx';
import { Notice } from './Notice.tsx';
import { rasterise } from './rasterise.ts';
import { SheetChoices } from './SheetChoices.tsx';
import { SheetTables } from './SheetTables.tsx';
import { Refusals, TakeAway } from './TakeAway.tsx';
import { TitleBlock } from './TitleBlock.tsx';
import './handOver.css';
import './print.css';

interface HandOverProps {
  /** The dimensioned drawing of the present sketch as an SVG text, on paper. */
  readonly drawSheet: () => string;
  /** The day of issue. */
  readonly date: Date;
  /** How the drawing is scaled, in words: "not to scale, heights × 1.75". */
  readonly scale: string;
  readonly clipboard: ClipboardHost;
  readonly download: FileHost['download'];
  readonly print: () => void;
  readonly onClose: () => void;
}

/** The hand-over sheet: title block, drawing, spacing table and what the numbers assume, to copy, download and print. */
export function HandOver({ drawSheet, date, scale, clipboard, download, print, onClose }: HandOverProps) {
  const sketch = useReading((reading) => reading.sketch);
  const datum = useReading((reading) => reading.view.datum);
  const digits = useReading((reading) => reading.view.digits);
  const unit = useReading((reading) => reading.view.unit);
  const spacing = useMemo(() => spacingTable(sketch, { datum, digits, unit }), [sketch, datum, digits, unit]);
  const table = spacing.ok ? spacing.value : null;
  const caution = cautionOf(sketch);
  const whyNot = useId();

  return (
    <SheetDialog title="Hand over" onClose={onClose}>
      <div className="hand-over">
        <div className="hand-over-controls">
          <SheetChoices hasMount={sketch.registerMm !== null} />
          <TakeAway
            table={table}
            whyNot={whyNot}
            clipboard={clipboard}
            download={download}
            downloadDrawing={(kind) => {
              const svg = withCaution(drawSheet(), caution);
              if (kind === 'SVG') downloadSvg(download, svg, sketch.title);
              else void downloadPng(download, svg, sketch.title, rasterise);
            }}
            print={print}
          />
          <Notice inSheet />
        </div>
        {!spacing.ok && (
          <Refusals
            id={whyNot}
            refusals={spacing.refusals}
            onShow={(partId) => {
              select(partId);
              onClose();
            }}
          />
        )}
        {table && (
          <article className="hand-over-sheet" aria-label="Hand-over sheet">
            <TitleBlock title={sketch.title} date={date} scale={scale} unit={unit} />
            {caution && <p className="hand-over-caution">{caution}</p>}
            <InlineSvg svg={drawSheet} of={sketch} label={`Drawing of ${sketch.title}`} />
            <SheetTables table={table} />
            <section aria-labelledby={`${whyNot}-notes`}>
              <h3 id={`${whyNot}-notes`} className="desk-head">
                What the numbers assume
              </h3>
              <ul className="hand-over-notes">
                {table.notes
                  .filter((note) => note !== caution)
                  .map((note) => (
                    <li key={note}>{note}</li>
                  ))}
              </ul>
              {sketch.notes.trim() !== '' && <p className="hand-over-own-notes">{sketch.notes}</p>}
            </section>
          </article>
        )}
      </div>
    </SheetDialog>
  );
}
