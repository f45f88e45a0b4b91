import { describe, expect, it } from 'vitest';
import { colourPlots } from '../../../app/plots/tabs/colour.ts';
import { contrastPlots } from '../../../app/plots/tabs/contrast.ts';
import { fanPlots } from '../../../app/plots/tabs/fans.ts';
import { fieldPlots } from '../../../app/plots/tabs/field.ts';
import { spotPlots } from '../../../app/plots/tabs/spots.ts';
import { sumPlots } from '../../../app/plots/tabs/sums.ts';
import { wavefrontPlots } from '../../../app/plots/tabs/wavefront.ts';
import { PLOT_TABS, plotsFor } from '../../../app/plots/tabs.ts';
import type { PlotDrawer } from '../../../app/store/viewStore.ts';
import type { PartId, Sketch } from '../../../engine/index.ts';
import { emptySketch, newGlass, newThin, settingAt, trainOf } from '../../../engine/index.ts';
import { PLOTS_VIEW, plotOf, plotSource } from './source.ts';

/** A sphere of 20 mm radius in front of a plane, f/2.5: strongly undercorrected, with three lines of N-BK7. */
const singlet = (): Sketch => ({
  ...emptySketch(),
  parts: [
    { ...newGlass(1, 1, 'p1' as PartId), surfaces: [surface(20), surface(null)], fillings: [filling(5)] },
  ],
  stop: 'p1' as PartId,
  aperture: { kind: 'infinityFNumber', fNumber: 2.5 },
  field: { size: { kind: 'angle', angleDeg: 8 }, fractions: [0, 0.7, 1], vignetting: 0 },
  sensor: { size: { diagonalMm: 10 }, pixelPitchMm: 0.05 },
});

const surface = (radiusMm: number | null) => ({ radiusMm, conic: 0, asphere: [], semiDiameterMm: null });
const filling = (thicknessMm: number) => ({ thicknessMm, material: { material: 'n-bk7' } });

const thin = (): Sketch => ({
  ...emptySketch(),
  parts: [{ ...newThin(50, 'p1' as PartId), abbeNumber: 60 }],
  stop: 'p1' as PartId,
});

/** Heights of rays through the singlet by Snell's law at the sphere and the plane, in trigonometry: the error at its paraxial focus. */
function traced(sketch: Sketch, heightMm: number): number {
  const { index } = trainOf(sketch, settingAt(sketch.positions[0]?.id ?? ('' as never)));
  const n = index[1] ?? 1;
  const [r, t] = [20, 5];
  const incidence = Math.asin(heightMm / r);
  const slope = incidence - Math.asin(heightMm / r / n);
  const x = r * (1 - Math.cos(incidence));
  const atPlane = heightMm - (t - x) * Math.tan(slope);
  const behind = Math.asin(n * Math.sin(slope));
  const f = r / (n - 1);
  return atPlane - (f - t / n) * Math.tan(behind);
}

describe('the plots of a single lens', () => {
  it('show the ray error that trigonometry gives at the rim of the stop', () => {
    const sketch = singlet();
    const fan = plotOf(fanPlots(plotSource(sketch)), 'Tangential, axis', 'curves');
    const [main] = fan.curves;
    const rimMm = plotSource(sketch).setup.stopRadiusMm;
    expect(main?.name).toBe('main 587.6 nm');
    expect(main?.y.at(-1)).toBeCloseTo(1000 * traced(sketch, rimMm), 6);
    expect(main?.y.at(0)).toBeCloseTo(-1000 * traced(sketch, rimMm), 6);
  });

  it('tell fields by colour, and lines by dash and word', () => {
    const plots = fanPlots(plotSource(singlet()));
    expect(plots.map(({ title }) => title)).toEqual([
      'Tangential, axis',
      'Sagittal, axis',
      'Tangential, 0.7 field',
      'Sagittal, 0.7 field',
      'Tangential, full field',
      'Sagittal, full field',
    ]);
    expect(plotOf(plots, 'Tangential, axis', 'curves').curves.map(({ style }) => style)).toEqual([
      'curve axial main',
      'curve axial short',
      'curve axial long',
    ]);
    expect(plotOf(plots, 'Tangential, full field', 'curves').curves[0]?.style).toBe('curve field outer main');
  });

  it('are coarse with fewer rays, at the same values', () => {
    const last = (quality: 'coarse' | 'fine') =>
      plotOf(fanPlots(plotSource(singlet(), quality)), 'Tangential, axis', 'curves').curves[0];
    expect([last('coarse')?.x.length, last('fine')?.x.length]).toEqual([21, 41]);
    expect(last('coarse')?.y.at(-1)).toBeCloseTo(last('fine')?.y.at(-1) ?? Number.NaN, 6);
  });

  it('agree on the spot: its rms in the figures, its edge not beyond the square', () => {
    const spot = plotOf(spotPlots(plotSource(singlet())), 'Spot, axis', 'spots');
    expect(spot.figures[0]).toBe(`rms ${spot.spots[0]?.rms.toFixed(2)} µm`);
    expect(spot.reach).toBeGreaterThanOrEqual(spot.spots[0]?.largest ?? Number.NaN);
  });

  it('string spots along the axis as far as beyond the least one', () => {
    const source = plotSource(singlet(), 'fine', { spots: 'throughFocus' });
    const { spots, x } = plotOf(spotPlots(source), 'Spot, axis', 'spots');
    const sizes = spots.map(({ rms }) => rms);
    const least = sizes.indexOf(Math.min(...sizes));
    expect(least).toBeGreaterThan(0);
    expect(least).toBeLessThan(sizes.length - 1);
    // Undercorrected: the least spot lies in front of the paraxial focus.
    expect(spots[least]?.at).toBeLessThan(0);
    expect(x?.to).toBe(spots.at(-1)?.at);
  });

  it('show the longitudinal error in front of the image plane, and the short line focused in front of the long one', () => {
    const plot = plotOf(colourPlots(plotSource(singlet())), 'Longitudinal error', 'curves');
    const [main, short, long] = plot.curves;
    expect(main?.y[0]).toBeCloseTo(0, 9);
    expect(main?.y.at(-1)).toBeLessThan(0);
    expect(short?.y[0]).toBeLessThan(long?.y[0] ?? Number.NaN);
    const axial = plotOf(colourPlots(plotSource(singlet())), 'Axial colour', 'curves');
    const [, paraxial] = axial.curves;
    expect(paraxial?.y[0]).toBeCloseTo(short?.y[0] ?? Number.NaN, 9);
    expect(paraxial?.y.at(-1)).toBeCloseTo(long?.y[0] ?? Number.NaN, 9);
  });

  it('have curves over the field that begin as on the axis', () => {
    const plots = fieldPlots(plotSource(singlet()));
    const field = plotOf(plots, 'Field curves', 'curves');
    expect(field.curves[0]?.y[0]).toBeCloseTo(field.curves[1]?.y[0] ?? Number.NaN, 9);
    expect(plotOf(plots, 'Distortion', 'curves').curves[0]?.y[0]).toBe(0);
    expect(plotOf(plots, 'Relative illumination', 'curves').curves[0]?.y[0]).toBeCloseTo(100, 9);
  });

  it('keep contrast between nothing and what diffraction leaves on the axis', () => {
    const plots = contrastPlots(plotSource(singlet()));
    expect(plots.map(({ title }) => title)).toEqual([
      'At Nyquist, 10.0 line pairs per mm',
      'At half Nyquist, 5.0 line pairs per mm',
    ]);
    for (const plot of plots) {
      if (plot.kind !== 'curves') throw new Error('no contrast');
      for (const { y } of plot.curves) for (const value of y) expect(value).toBeLessThanOrEqual(100 + 1e-9);
    }
  });

  it('hang each surface’s share of a sum under it, which add up to the last sum so far', () => {
    const plot = plotOf(sumPlots(plotSource(singlet())), 'Spherical aberration', 'stems');
    expect(plot.stems.map(({ name }) => name)).toEqual(['glass 1, surface 1', 'glass 1, surface 2']);
    const sum = plot.stems.reduce((total, { value }) => total + value, 0);
    expect(plot.stems.at(-1)?.sum).toBeCloseTo(sum, 12);
    expect(sum).toBeGreaterThan(0);
  });
});

describe('plots that have nothing to show', () => {
  it('say once that thin parts have no wavefront across the meridian', () => {
    const plots = wavefrontPlots(plotSource(thin()));
    expect(plots.filter(({ kind }) => kind === 'empty').map(({ title }) => title)).toEqual(['Sagittal']);
  });

  it('say that a bending is missing, but for colour', () => {
    expect(sumPlots(plotSource(thin()))[0]?.notes).toEqual(['without element 1: no bending is given']);
    expect(sumPlots(plotSource(thin(), 'fine', { sum: 'axialColour' }))[0]?.notes).toEqual([]);
  });

  it('say so in every tab, on an empty sketch, afocal, with every ray lost and without a pixel pitch', () => {
    const lost: Sketch = {
      ...singlet(),
      parts: [
        { ...newGlass(1, 1, 'p1' as PartId), surfaces: [surface(5), surface(-5)], fillings: [filling(10)] },
      ],
      aperture: { kind: 'entrancePupilDiameter', diameterMm: 30 },
    };
    const afocal: Sketch = {
      ...thin(),
      parts: [
        { ...newThin(50, 'p1' as PartId), space: { lengthMm: 100, medium: 'air' } },
        newThin(50, 'p2' as PartId),
      ],
      aperture: { kind: 'entrancePupilDiameter', diameterMm: 5 },
    };
    for (const sketch of [emptySketch(), lost, afocal, { ...singlet(), sensor: null }]) {
      for (const tab of Object.keys(PLOT_TABS) as PlotDrawer[]) {
        const setting = settingAt(sketch.positions[0]?.id ?? ('' as never));
        for (const quality of ['coarse', 'fine'] as const) {
          const plots = plotsFor({ tab, sketch, setting, view: PLOTS_VIEW, unit: 'mm' }, quality);
          expect(plots.length).toBeGreaterThan(0);
          for (const plot of plots) {
            if (plot.kind === 'empty') expect(plot.sentence).toMatch(/^[A-Z].*[.:]?/);
            if (plot.kind === 'curves')
              for (const { x, y } of plot.curves) {
                expect(x.every(Number.isFinite)).toBe(true);
                expect(y.every(Number.isFinite)).toBe(true);
              }
          }
        }
      }
    }
  });
});
