import type { ReactNode } from 'react';
import { Group } from '../ui/Group.tsx';
import { useFolding } from './folding.ts';
import { Positions } from './Positions.tsx';
import { ApertureFields } from './sketch/ApertureFields.tsx';
import { Caution } from './sketch/Caution.tsx';
import { FieldFields } from './sketch/FieldFields.tsx';
import { LinesFields } from './sketch/LinesFields.tsx';
import { MediumFields } from './sketch/MediumFields.tsx';
import { ObjectDistanceField } from './sketch/ObjectDistanceField.tsx';
import { ScaleFields } from './sketch/ScaleFields.tsx';
import { SensorFields } from './sketch/SensorFields.tsx';
import { ShownFields } from './sketch/ShownFields.tsx';
import { TextFields } from './sketch/TextFields.tsx';
import './card.css';
import './readouts.css';

interface Section {
  readonly name: string;
  readonly startsFolded?: boolean;
  readonly fields: ReactNode;
}

const SECTIONS: readonly Section[] = [
  {
    name: 'Object',
    fields: (
      <>
        <ObjectDistanceField />
        <MediumFields label="Medium" where="object" />
        <Caution />
      </>
    ),
  },
  {
    name: 'Aperture and field',
    fields: (
      <>
        <ApertureFields />
        <FieldFields />
      </>
    ),
  },
  { name: 'Image and sensor', fields: <SensorFields /> },
  { name: 'Zoom and focus positions', startsFolded: true, fields: <Positions /> },
  { name: 'Title and notes', startsFolded: true, fields: <TextFields /> },
  { name: 'Lines and allowances', startsFolded: true, fields: <LinesFields /> },
  { name: 'Drawn', startsFolded: true, fields: <ShownFields /> },
  { name: 'Scale the sketch', startsFolded: true, fields: <ScaleFields /> },
];

interface SketchCardProps {
  /** Whether it has a heading; where it stands in a sheet, that has one. */
  readonly titled?: boolean;
}

/** The sketch as a whole, for when nothing is selected. */
export function SketchCard({ titled = true }: SketchCardProps) {
  return (
    <section className="panel" aria-label="Sketch">
      {titled && <h2 className="panel-title">Sketch</h2>}
      {SECTIONS.map((section) => (
        <FoldingSection key={section.name} {...section} />
      ))}
    </section>
  );
}

function FoldingSection({ name, startsFolded = false, fields }: Section) {
  const [folded, fold] = useFolding(`sketch: ${name}`, startsFolded);
  return (
    <Group title={name} folded={folded} onFold={fold}>
      {fields}
    </Group>
  );
}
