import { describe, expect, it } from 'vitest';
import { type Mark, recorderPen } from '../../../../app/board/recorderPen.ts';
import { xOf, yOf } from '../../../../app/board/viewport.ts';
import { lostPlaces } from '../../../../app/drawing/exact/layer.ts';
import { exactRaysOf } from '../../../../app/drawing/exact/rays.ts';
import {
  beyondLimit,
  largestWhisker,
  whiskersLayer,
  whiskersOf,
} from '../../../../app/drawing/exact/whiskers.ts';
import { raysLayer } from '../../../../app/drawing/layers/rays.ts';
import type { Picture } from '../../../../app/layout/picture.ts';
import { type ExactView, viewStore } from '../../../../app/store/viewStore.ts';
import type { PartId, Sketch } from '../../../../engine/index.ts';
import { emptySketch, newGlass } from '../../../../engine/index.ts';
import { realZoom } from '../../../engine/realZoom.ts';
import { readingOf } from '../../reading.ts';
import { demoPicture, pictureFor } from '../seen.ts';

const { exact: AS_AT_FIRST } = viewStore.getInitialState();
const shownAs = (change: Partial<ExactView>) => ({ exact: { ...AS_AT_FIRST, ...change } });

function drawn({ scene, view }: Picture): readonly Mark[] {
  const pen = recorderPen(3);
  raysLayer(pen, scene, view);
  return pen.marks;
}
const linesOf = (marks: readonly Mark[], style: string) =>
  marks.flatMap((mark) => (mark.kind === 'lines' && mark.style === style ? mark.lines : []));
const stylesOf = (marks: readonly Mark[]) => [
  ...new Set(marks.flatMap((mark) => (mark.kind === 'lines' ? mark.style : []))),
];

/** A biconvex lens of short radii with so wide a bundle that its edge never meets the second surface. */
function steep(frontMm = 20): Sketch {
  const lens = newGlass(20, 6, 'p1' as PartId);
  return {
    ...emptySketch(),
    parts: [
      {
        ...lens,
        surfaces: [
          { radiusMm: frontMm, conic: 0, asphere: [], semiDiameterMm: null },
          { radiusMm: -8, conic: 0, asphere: [], semiDiameterMm: null },
        ],
        fillings: [{ thicknessMm: 6, material: { name: 'glass', index: 1.6, abbeNumber: 50 } }],
      },
    ],
    stop: lens.id,
    aperture: { kind: 'entrancePupilDiameter', diameterMm: 18 },
  };
}

describe('rays through ideal parts', () => {
  it('are drawn once, solid: both kinds are the same', () => {
    const picture = demoPicture();
    expect(picture.scene.exact).toBeNull();
    expect(stylesOf(drawn(picture)).filter((style) => style.endsWith('paraxial'))).toEqual([]);
  });
});

describe('rays through glass', () => {
  const zoom = realZoom();
  const picture = pictureFor(zoom);
  const marks = drawn(picture);

  it('are drawn exact and solid, and paraxial and dashed where they run apart', () => {
    expect(linesOf(marks, 'marginal ray')).toHaveLength(2);
    expect(linesOf(marks, 'marginal ray paraxial').length).toBeGreaterThan(0);
    const rays = exactRaysOf(picture.reading);
    const height = rays?.pencils.find(({ name }) => name === 'marginal ray')?.rays[0]?.exact.at(-1) ?? 0;
    expect(height).toBeCloseTo(0.2053, 4);
    expect(linesOf(marks, 'marginal ray')[0]?.at(-1)).toBeCloseTo(yOf(picture.view, height), 3);
  });

  it('leave dashes out where both lie on each other', () => {
    const dashes = linesOf(marks, 'marginal ray paraxial');
    const whole = linesOf(marks, 'marginal ray')[0]?.length ?? 0;
    for (const line of dashes) expect(line.length).toBeLessThan(whole);
    // In front of the first surface a paraxial and an exact ray from infinity to the rim of the stop still run together.
    const firstX = xOf(picture.view, 0);
    for (const line of dashes) expect(line[0]).toBeGreaterThanOrEqual(firstX);
  });

  it('bend at the real surfaces, not at the vertices', () => {
    const ray = exactRaysOf(picture.reading)?.pencils.find(({ name }) => name === 'marginal ray')?.rays[0];
    const { train } = picture.reading.analysis;
    const [z = 0, y = 0] = ray?.exact.slice(2, 4) ?? [];
    // The sag of a sphere of that curvature at that height.
    const c = train.curvature[0] ?? 0;
    expect(z).toBeCloseTo((c * y * y) / (1 + Math.sqrt(1 - c * c * y * y)), 12);
    expect(Math.abs(z)).toBeGreaterThan(0.01);
  });

  it('can be hidden, either kind', () => {
    const paraxialOnly = stylesOf(drawn(pictureFor(zoom, shownAs({ exact: false }))));
    expect(paraxialOnly.every((style) => style.endsWith('paraxial'))).toBe(true);
    expect(paraxialOnly).toContain('chief ray paraxial');
    const exactOnly = stylesOf(drawn(pictureFor(zoom, shownAs({ paraxial: false }))));
    expect(exactOnly).toContain('chief ray');
    expect(exactOnly.some((style) => style.endsWith('paraxial'))).toBe(false);
  });

  it('are traced once for one look: the panel reads the very rays of the drawing', () => {
    expect(exactRaysOf(readingOf(zoom))).toBe(exactRaysOf(readingOf(zoom, { selection: ['image'] })));
  });
});

describe('lost rays', () => {
  const picture = pictureFor(steep());
  const rays = picture.scene.exact?.rays;

  it('end with a cross where they are lost, and say why when pointed at', () => {
    expect(rays).toBeTruthy();
    const lost = rays ? lostPlaces(rays) : [];
    expect(lost.length).toBeGreaterThan(0);
    expect(linesOf(drawn(picture), 'lost')).toHaveLength(2 * lost.length);
    const handle = picture.handles.find(({ id }) => id === 'lost:0');
    expect(handle?.says).toMatch(/surface 2 \(glass 1\)/);
    expect(handle?.fixed).toBe(true);
  });
});

describe('drift whiskers', () => {
  const picture = pictureFor(realZoom(), shownAs({ whiskers: true, stretch: 10 }));
  const rays = picture.scene.exact?.rays;
  if (!rays) throw new Error('the zoom has exact rays');
  const whiskers = whiskersOf(rays);
  const layer = (change: Partial<ExactView>): readonly Mark[] => {
    const pen = recorderPen(3);
    whiskersLayer(pen, rays, { ...AS_AT_FIRST, whiskers: true, ...change }, picture.view);
    return pen.marks;
  };

  it('stand at every surface that a ray meets', () => {
    const marginal = rays.pencils.find(({ name }) => name === 'marginal ray')?.rays[0];
    expect(whiskers.filter(({ ray }) => ray === marginal).map(({ surface }) => surface)).toEqual(
      Array.from({ length: 14 }, (_, k) => k),
    );
  });

  it('run from the paraxial ray, so many times as long as the drift', () => {
    const longest = whiskers.reduce((a, b) => (Math.abs(b.driftMm) > Math.abs(a.driftMm) ? b : a));
    const { view } = picture;
    const x = xOf(view, longest.zMm);
    const line = [x, yOf(view, longest.fromMm), x, yOf(view, longest.fromMm + 10 * longest.driftMm)];
    const lines = linesOf(layer({ stretch: 10, driftLimitMm: 0 }), 'drift beyond');
    expect(lines).toContainEqual(line.map((value) => expect.closeTo(value, 2)));
  });

  it('beyond the limit are told apart and counted', () => {
    const sizes = whiskers.map(({ driftMm }) => Math.abs(driftMm)).sort((a, b) => b - a);
    const limit = ((sizes[4] ?? 0) + (sizes[5] ?? 0)) / 2;
    expect(beyondLimit(whiskers, limit)).toBe(5);
    expect(linesOf(layer({ driftLimitMm: limit }), 'drift beyond')).toHaveLength(2 * 5);
  });

  it('the largest of all has a ring when it is pointed at', () => {
    const { largest } = rays;
    const sizes = rays.pencils.flatMap(({ rays: list }) =>
      list.flatMap((ray) => [...ray.heightDriftMm, ray.imageDriftMm ?? 0].map(Math.abs)),
    );
    expect(Math.abs(largest?.driftMm ?? 0)).toBe(Math.max(...sizes));
    const circles = layer({ whiskers: false, largest: true }).filter(({ kind }) => kind === 'circle');
    expect(circles).toHaveLength(1);
  });

  it('the largest stands on the image plane where that is its place, also when the image is virtual', () => {
    const virtual = pictureFor(steep(-8), shownAs({ largest: true }));
    for (const { scene, reading } of [picture, virtual]) {
      const whisker = scene.exact?.rays ? largestWhisker(scene.exact.rays) : null;
      const { train, conjugates } = reading.analysis;
      const place = conjugates.imagePlaneMm;
      expect(whisker?.surface).toBe(train.count);
      expect(whisker?.zMm).toBeCloseTo((train.z.at(-1) ?? 0) + (place.ok ? place.value : Number.NaN), 9);
    }
  });
});
