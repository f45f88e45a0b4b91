import type { ReactNode } from 'react';
import { Group } from '../ui/Group.tsx';
import { useFolding } from './folding.ts';
import { ApertureFields } from './sketch/ApertureFields.tsx';
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

/** The sketch as a whole, for when nothing is selected. */
export function SketchCard() {
  return (
    <section className="panel" aria-labelledby="sketch-card-title">
      <h2 className="panel-title" id="sketch-card-title">
        Sketch
      </h2>
      <Section name="Object">
        <ObjectDistanceField />
        <MediumFields label="Medium" where="object" />
      </Section>
      <Section name="Aperture and field">
        <ApertureFields />
        <FieldFields />
      </Section>
      <Section name="Image and sensor">
        <SensorFields />
      </Section>
      <Section name="Title and notes" startsFolded>
        <TextFields />
      </Section>
      <Section name="Lines and allowances" startsFolded>
        <LinesFields />
      </Section>
      <Section name="Drawn" startsFolded>
        <ShownFields />
      </Section>
      <Section name="Scale the sketch" startsFolded>
        <ScaleFields />
      </Section>
    </section>
  );
}

interface SectionProps {
  readonly name: string;
  readonly startsFolded?: boolean;
  readonly children: ReactNode;
}

function Section({ name, startsFolded = false, children }: SectionProps) {
  const [folded, fold] = useFolding(`sketch: ${name}`, startsFolded);
  return (
    <Group title={name} folded={folded} onFold={fold}>
      {children}
    </Group>
  );
}
