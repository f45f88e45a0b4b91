import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { partIn, type RayLine, sceneOf } from '../../../app/drawing/scene.ts';
import { analysisOf } from '../../../app/live/analysis.ts';
import { viewStore } from '../../../app/store/viewStore.ts';
import type { PartId, Sketch } from '../../../engine/index.ts';
import { emptySketch, newPlate, newStop, newThin, settingAt } from '../../../engine/index.ts';
import { inspectionZoom, MIDDLE } from '../../engine/demo.ts';
import { anySketch } from '../../engine/sketch/arbitrary.ts';
import { readingOf } from '../reading.ts';
import { ALL_SHOWN, AT_MIDDLE, sceneFor } from './seen.ts';

/** Heights are copied from the engine or added up once more: a few units in the last place of what was added. */
const SAME_HEIGHT = 1e-12;
/** A ray drawn through the very edge of a rim may pass it by rounding. */
const RIM_DUST = 1e-9;

const demo = inspectionZoom();
const scene = sceneFor(demo, { setting: AT_MIDDLE });
const analysis = analysisOf(demo, AT_MIDDLE);
const ends = (line: RayLine | null | undefined) => ({
  fromMm: line?.[0],
  fromYMm: line?.[1],
  toMm: line?.at(-2),
  toYMm: line?.at(-1),
});

describe('the scene of the demo', () => {
  it('draws every part where the engine places it', () => {
    expect(scene.parts.map(({ part, frontMm }) => [part.id, frontMm])).toEqual(
      analysis.places.parts.map(({ frontMm }, index) => [`p${index + 1}`, frontMm]),
    );
    expect(scene.parts.map(({ carriesStop }) => carriesStop)).toEqual([false, true, false, false]);
  });

  it('starts rays on the object and ends them on the sensor', () => {
    for (const line of [...scene.marginal, scene.chief, ...scene.axial]) {
      expect(ends(line).fromMm).toBe(-500);
      expect(ends(line).toMm).toBeCloseTo(110, 9);
    }
    for (const line of scene.marginal) {
      expect(ends(line).fromYMm).toBeCloseTo(0, 9);
      expect(ends(line).toYMm).toBeCloseTo(0, 9);
    }
  });

  it('takes the heights at the parts from the engine', () => {
    const { marginal, chief } = analysis.rays;
    if (!marginal.ok || !chief.ok) throw new Error('the demo has both rays');
    for (let k = 0; k < 4; k++) {
      expect(scene.marginal[0]?.[2 * k + 3]).toBe(marginal.value.y[k]);
      expect(scene.marginal[1]?.[2 * k + 3]).toBe(-marginal.value.y[k]!);
      expect(scene.chief?.[2 * k + 3]).toBe(chief.value.y[k]);
    }
  });

  it('lets the chief ray leave the object’s tip, cross the axis in the stop and end at the field’s edge', () => {
    expect(ends(scene.chief).fromYMm).toBeCloseTo(-5.5 / 0.08, 6);
    expect(scene.chief?.[5]).toBe(0);
    expect(ends(scene.chief).toYMm).toBeCloseTo(5.5, 9);
    expect(scene.objectHeightMm).toBeCloseTo(-68.75, 6);
    expect(scene.imageHeightMm).toBeCloseTo(5.5, 9);
  });

  it('draws the stop on the second group at the diameter that f/5.6 asks for', () => {
    expect(scene.stop?.zMm).toBe(scene.parts[1]?.frontMm);
    expect(2 * (scene.stop?.semiMm ?? 0)).toBeCloseTo(13.383, 3);
  });

  it('shows the image of the first group as virtual, in front of it', () => {
    const image = scene.images[0];
    expect(image).toMatchObject({ partIndex: 0, real: false, objectOf: null });
    expect(image?.zMm).toBeCloseTo(-30.0752, 4);
    expect([image?.extension?.[0], image?.extension?.[2]]).toEqual([0, image?.zMm]);
  });

  it('shows the image of the second group as the object of the third, behind it', () => {
    const image = scene.images[1];
    expect(image).toMatchObject({ partIndex: 1, objectOf: 2, real: false });
    expect((image?.zMm ?? 0) - (scene.parts[2]?.frontMm ?? 0)).toBeCloseTo(30.3422, 4);
  });

  it('shows no image of the last part beside the sensor', () => {
    expect(scene.images.map(({ partIndex }) => partIndex)).not.toContain(3);
  });

  it('draws as many rays a bundle as chosen, at the fields chosen, the axis apart', () => {
    const three = sceneFor(demo, { setting: AT_MIDDLE, raysPerBundle: 3 });
    expect(three.axial).toHaveLength(3);
    expect(three.bundles.map(({ share, rays }) => [share, rays.length])).toEqual([
      [0.7, 3],
      [1, 3],
    ]);
    const one = sceneFor(demo, { setting: AT_MIDDLE, raysPerBundle: 1 });
    expect([...(one.bundles[1]?.rays[0] ?? [])]).toEqual([...(one.chief ?? [])]);
  });

  it('leaves out what is switched off and adds what is switched on', () => {
    const none = sceneFor(demo, {
      setting: AT_MIDDLE,
      shown: { ...ALL_SHOWN, bundles: false, images: false, pupils: false },
    });
    expect([none.axial, none.bundles, none.images]).toEqual([[], [], []]);
    expect(none.marginal).toHaveLength(2);
    expect(none.planes.map(({ name }) => name)).toEqual([
      'front principal plane',
      'rear principal plane',
      'front focus',
      'rear focus',
    ]);
    const pupils = sceneFor(demo, { setting: AT_MIDDLE, shown: ALL_SHOWN }).planes;
    expect(pupils.find(({ name }) => name === 'entrance pupil')?.zMm).toBeCloseTo(14.427, 3);
    expect(2 * (pupils.find(({ name }) => name === 'entrance pupil')?.semiMm ?? 0)).toBeCloseTo(7.349, 3);
  });

  it('puts the mount plane its register distance in front of the sensor', () => {
    const mounted = sceneFor({ ...demo, registerMm: 17.526 }, { setting: AT_MIDDLE });
    expect(mounted.mountMm).toBeCloseTo(110 - 17.526, 9);
    expect(scene.mountMm).toBeNull();
  });

  it('marks the selected parts', () => {
    const selected = sceneFor(demo, { selection: ['p3' as PartId, 'object'] });
    expect(selected.parts.map((part) => part.selected)).toEqual([false, false, true, false]);
    expect(partIn(selected, 'p3' as PartId)?.index).toBe(2);
    expect(partIn(selected, 'nobody' as PartId)).toBeUndefined();
  });
});

describe('the height that an open part is drawn at', () => {
  it('is a little more than the rays need, and its rim where it has one', () => {
    const { marginal, chief } = analysis.rays;
    if (!marginal.ok || !chief.ok) throw new Error('the demo has both rays');
    for (const [k, part] of scene.parts.entries()) {
      const needed = Math.abs(marginal.value.y[k]!) + Math.abs(chief.value.y[k]!);
      expect(part.semiMm).toBeGreaterThan(needed);
      expect(part.semiMm).toBeLessThan(2 * needed);
    }
    const rimmed = { ...demo, parts: demo.parts.with(0, { ...demo.parts[0]!, semiDiameterMm: 9 }) };
    expect(sceneFor(rimmed).parts[0]?.semiMm).toBe(9);
  });

  it('is a share of the length where no ray says how tall', () => {
    const bare: Sketch = { ...emptySketch(), parts: [newThin(50)] };
    const semiMm = sceneFor(bare).parts[0]?.semiMm ?? 0;
    expect(semiMm).toBeGreaterThan(1);
    expect(semiMm).toBeLessThan(50);
  });

  it('of a field lens where rays come together is still tall enough to be seen', () => {
    const atImage: Sketch = {
      ...emptySketch(),
      parts: [
        { ...newThin(100, 'p1' as PartId), space: { lengthMm: 100, medium: 'air' } },
        { ...newThin(80, 'p2' as PartId), space: { lengthMm: 0, medium: 'air' } },
      ],
      stop: 'p1' as PartId,
      field: { size: { kind: 'angle', angleDeg: 0 }, fractions: [0], vignetting: 0 },
    };
    const [first, second] = sceneFor(atImage).parts;
    expect(second?.semiMm).toBeGreaterThan(0.2 * (first?.semiMm ?? 0));
  });
});

describe('the scene of a bare sketch', () => {
  it('without parts has an axis and nothing on it', () => {
    const empty = sceneFor(emptySketch(), { shown: ALL_SHOWN });
    expect(empty).toMatchObject({
      parts: [],
      stop: null,
      marginal: [],
      chief: null,
      axial: [],
      bundles: [],
      images: [],
      planes: [],
      objectHeightMm: null,
      imageHeightMm: null,
      tallestMm: 0,
    });
  });

  it('with the object at infinity has no object height', () => {
    const far: Sketch = { ...emptySketch(), parts: [newThin(50)], stop: 'p1' as PartId };
    const drawn = sceneFor(far);
    expect(drawn.objectHeightMm).toBeNull();
    expect(drawn.imageHeightMm).toBeCloseTo(50 * Math.tan(Math.PI / 18), 9);
  });

  it('gives a plate its two faces and a diaphragm that is not the stop its own opening', () => {
    const sketch: Sketch = {
      ...emptySketch(),
      parts: [
        { ...newPlate(6, 'p1' as PartId), space: { lengthMm: 10, medium: 'air' } },
        { ...newStop('p2' as PartId), semiDiameterMm: 3 },
      ],
    };
    const [plate, stop] = sceneFor(sketch).parts;
    expect([plate?.frontMm, plate?.rearMm]).toEqual([0, 6]);
    expect(stop).toMatchObject({ frontMm: 16, semiMm: 3, carriesStop: false });
  });

  it('takes half the diagonal for the sensor’s reach', () => {
    expect(scene.sensorSemiMm).toBe(5.5);
    expect(sceneFor({ ...demo, sensor: null }).sensorSemiMm).toBeNull();
  });
});

describe('bundles', () => {
  /** The demo with a rim on the third group that cuts the edge of the field. */
  const cut: Sketch = { ...demo, parts: demo.parts.with(2, { ...demo.parts[2]!, semiDiameterMm: 5 }) };

  it('keep to what the rims let through', () => {
    const drawn = sceneFor(cut, { setting: AT_MIDDLE });
    const open = sceneFor(demo, { setting: AT_MIDDLE });
    const heights = (of: typeof drawn) => of.bundles.at(-1)?.rays.map((ray) => Math.abs(ray[7] ?? 0)) ?? [];
    expect(Math.max(...heights(open))).toBeGreaterThan(5);
    expect(Math.max(...heights(drawn))).toBeCloseTo(5, 9);
  });

  it('of the axis keep to them too', () => {
    const narrow: Sketch = { ...demo, parts: demo.parts.with(2, { ...demo.parts[2]!, semiDiameterMm: 2 }) };
    const drawn = sceneFor(narrow, { setting: AT_MIDDLE });
    const heights = drawn.axial.map((ray) => Math.abs(ray[7] ?? 0));
    expect(Math.max(...heights)).toBeCloseTo(2, 9);
  });

  it('of a field that is dark are not drawn', () => {
    const { marginal, chief } = analysis.rays;
    if (!marginal.ok || !chief.ok) throw new Error('the demo has both rays');
    const outside = Math.abs(chief.value.y[0]!) - Math.abs(marginal.value.y[0]!);
    const dark: Sketch = {
      ...demo,
      parts: demo.parts.with(0, { ...demo.parts[0]!, semiDiameterMm: 0.9 * outside }),
      field: { ...demo.field, fractions: [0, 1] },
    };
    const { vignetting } = analysisOf(dark, settingAt(MIDDLE));
    expect(vignetting.ok && vignetting.value[1]?.meridian).toBeNull();
    expect(sceneFor(dark, { setting: AT_MIDDLE }).bundles).toEqual([]);
  });

  it('never pass a rim on any sketch', () => {
    fc.assert(
      fc.property(anySketch({ leastParts: 1 }), (sketch) => {
        const reading = readingOf(sketch);
        const { train } = reading.analysis;
        const { bundles, axial } = sceneOf(sketch, reading.analysis, reading.view);
        const limited = reading.analysis.vignetting.ok && sketch.field.fractions.includes(0);
        const rays = [...bundles.flatMap(({ rays }) => rays), ...(limited ? axial : [])];
        const beyond = rays.filter((ray) =>
          train.semiDiameter.some(
            (semiMm, k) => Math.abs(ray[2 * k + 3] ?? 0) > semiMm * (1 + RIM_DUST) + RIM_DUST,
          ),
        );
        expect(beyond).toEqual([]);
      }),
    );
  });

  it('are sums of the chief and the marginal ray on any sketch', () => {
    fc.assert(
      fc.property(anySketch({ leastParts: 1 }), (sketch) => {
        const { analysis: ofSketch } = readingOf(sketch);
        const { bundles, marginal, chief, stage } = sceneOf(sketch, ofSketch, viewStore.getInitialState());
        if (!ofSketch.vignetting.ok) return;
        const passing = ofSketch.vignetting.value.filter(({ fraction }) => fraction !== 0);
        for (const { share, rays } of bundles) {
          const limits = passing.filter(({ fraction }) => fraction === share).map(({ meridian }) => meridian);
          const first = rays[0];
          const last = rays.at(-1);
          expect([first?.[0], last?.at(-2)]).toEqual([stage.startMm, stage.endMm]);
          const fits = limits.some(
            (limit) =>
              limit !== null &&
              [...(first ?? [])].every((value, i) => {
                if (i % 2 === 0) return true;
                const parts = [share * (chief?.[i] ?? 0), limit.lower * (marginal[0]?.[i] ?? 0)] as const;
                return (
                  Math.abs(value - parts[0] - parts[1]) <=
                  SAME_HEIGHT * (1 + Math.abs(parts[0]) + Math.abs(parts[1]))
                );
              }),
          );
          expect(fits).toBe(true);
        }
      }),
    );
  });
});
