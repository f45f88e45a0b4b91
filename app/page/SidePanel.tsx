import { useReading } from '../live/reading.ts';
import type { Commands } from '../panels/CommandButton.tsx';
import { PartCard } from '../panels/PartCard.tsx';
import { Readouts } from '../panels/Readouts.tsx';
import { SketchCard } from '../panels/SketchCard.tsx';
import { SummaryStrip } from '../panels/SummaryStrip.tsx';
import { Warnings } from '../panels/Warnings.tsx';

interface SidePanelProps {
  readonly commands: Commands;
}

/** The panel on the right: the fixed strip, the readouts, what is selected (or the sketch as a whole), and the warnings. */
export function SidePanel({ commands }: SidePanelProps) {
  return (
    <aside className="side" aria-label="Panel">
      <SummaryStrip onWarnings={showWarnings} />
      <div className="side-scroll">
        <Readouts />
        <Card commands={commands} />
        <div id="warnings">
          <Warnings />
        </div>
      </div>
    </aside>
  );
}

/** What is selected, or the sketch as a whole. */
function Card({ commands }: SidePanelProps) {
  const something = useReading(({ view }) => view.selection.length > 0);
  return something ? <PartCard commands={commands} /> : <SketchCard />;
}

function showWarnings(): void {
  document.getElementById('warnings')?.scrollIntoView({ block: 'start' });
}
