import { useRef } from 'react';
import { useReadingNow } from '../live/reading.ts';
import { ParaxialAndExact } from '../panels/exact/ParaxialAndExact.tsx';
import { PartCard } from '../panels/PartCard.tsx';
import { Readouts } from '../panels/Readouts.tsx';
import { SketchCard } from '../panels/SketchCard.tsx';
import { SummaryStrip } from '../panels/SummaryStrip.tsx';
import type { Commands } from '../panels/useCommand.ts';
import { Warnings } from '../panels/Warnings.tsx';
import { useCardInView } from './useCardInView.ts';

interface SidePanelProps {
  readonly commands: Commands;
}

/** The panel on the right: the fixed strip, the readouts, what is selected (or the sketch as a whole), and the warnings. */
export function SidePanel({ commands }: SidePanelProps) {
  const panel = useRef<HTMLDivElement>(null);
  const place = useRef<HTMLDivElement>(null);
  useCardInView(panel, place);
  return (
    <aside className="side" aria-label="Panel">
      <SummaryStrip onWarnings={showWarnings} />
      <div ref={panel} className="side-scroll">
        <Readouts />
        <ParaxialAndExact commands={commands} />
        <div ref={place} className="side-card" />
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
  const something = useReadingNow(({ view }) => view.selection.length > 0);
  return something ? <PartCard commands={commands} /> : <SketchCard />;
}

function showWarnings(): void {
  document.getElementById('warnings')?.scrollIntoView({ block: 'start' });
}
