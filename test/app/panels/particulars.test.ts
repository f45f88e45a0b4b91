import { describe, expect, it } from 'vitest';
import { readoutById } from '../../../app/panels/readouts/table.ts';
import type { View } from '../../../app/store/viewStore.ts';
import type { PartId, Sketch } from '../../../engine/index.ts';
import { setAbbeNumber, setSemiDiameter, setStop, settingAt } from '../../../engine/index.ts';
import { inspectionZoom, MIDDLE } from '../../engine/demo.ts';
import { readingOf } from '../reading.ts';
import { afocal } from './sketches.ts';

const said = (sketch: Sketch, id: string, view: Partial<View> = { setting: settingAt(MIDDLE) }): string =>
  readoutById(id, sketch.field.fractions).particulars?.(readingOf(sketch, view)) ?? '';

const idAt = (sketch: Sketch, index: number): PartId => sketch.parts[index]?.id ?? ('none' as PartId);

describe('the particulars of a readout', () => {
  it('give front and rear focal length, none where the layout is afocal', () => {
    expect(said(inspectionZoom(), 'focalLength')).toBe(
      'Front focal length −n/φ −41.198 mm, rear focal length n′/φ 41.198 mm.',
    );
    expect(said(afocal(), 'focalLength', {})).toBe('');
  });

  it('name the rim that limits the axial bundle when no stop is given', () => {
    const demo = inspectionZoom();
    expect(said(demo, 'stopDiameter')).toBe('');
    const stopless = setStop(setSemiDiameter(demo, idAt(demo, 1), 3), null);
    expect(said(stopless, 'stopDiameter')).toBe(
      'No stop is given: the rim of second group limits the axial bundle.',
    );
  });

  it('name what limits the field', () => {
    expect(said(inspectionZoom(), 'exitWindowPlace')).toBe('The sensor limits the field.');
    const sensorless: Sketch = { ...inspectionZoom(), sensor: null };
    const rimmed = setSemiDiameter(sensorless, idAt(sensorless, 3), 6);
    expect(said(rimmed, 'exitWindowPlace')).toBe('The rim of fourth group limits the field.');
  });

  it('name the index that is assumed of glass', () => {
    expect(said(inspectionZoom(), 'petzvalSum')).toBe(
      'Thin parts without an index of their own count as 1.5.',
    );
  });

  it('name the parts that a colour sum leaves out', () => {
    const demo = inspectionZoom();
    const plain = demo.parts.reduce((sketch, { id }) => setAbbeNumber(sketch, id, null), demo);
    expect(said(plain, 'axialColour')).toBe('');
    expect(said(setAbbeNumber(plain, idAt(demo, 1), 60), 'axialColour')).toBe(
      'Without an Abbe number, and so left out: first group, third group, fourth group.',
    );
  });

  it('name what cuts the bundle at the edge of the field', () => {
    const demo = inspectionZoom();
    expect(said(demo, 'passing2')).toBe(
      'In the meridian it passes from −1 (the stop) to 1 (the stop) of the stop’s radius.',
    );
    // At the fourth group the bundle of the full field reaches from 3.2 to 7.9 mm: a rim at 6 mm cuts its upper end.
    const cut = setSemiDiameter(demo, idAt(demo, 3), 6);
    expect(said(cut, 'passing2')).toMatch(
      /^In the meridian it passes from −1 \(the stop\) to 0\.\d+ \(fourth group\)/,
    );
  });
});
