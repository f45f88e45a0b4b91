import { describe, expect, it } from 'vitest';
import type { Pen } from '../../../../app/board/pen.ts';
import { type Mark, recorderPen } from '../../../../app/board/recorderPen.ts';
import { PALETTES } from '../../../../app/board/styles.ts';
import { svgPen } from '../../../../app/board/svgPen.ts';
import { stretchBy, type Viewport, xOf, yOf, zoomAbout } from '../../../../app/board/viewport.ts';
import { glassLayer, partsLayer } from '../../../../app/drawing/layers/parts.ts';
import type { Scene } from '../../../../app/drawing/scene.ts';
import type { Picture } from '../../../../app/layout/picture.ts';
import type { PartId, Sketch } from '../../../../engine/index.ts';
import { emptySketch } from '../../../../engine/index.ts';
import { cementedPair, surface, withGlass } from '../glassSketch.ts';
import { pictureFor } from '../seen.ts';

function drawn({ scene }: Picture, view: Viewport, layer: (pen: Pen, scene: Scene, view: Viewport) => void) {
  const pen = recorderPen(9);
  layer(pen, scene, view);
  return pen.marks;
}
const linesOf = (marks: readonly Mark[], style: string): readonly (readonly number[])[] =>
  marks.flatMap((mark) => (mark.kind === 'lines' && mark.style === style ? mark.lines : []));
const outlinesOf = (marks: readonly Mark[]): readonly (readonly number[])[] =>
  marks.flatMap((mark) => (mark.kind === 'closed' ? [mark.points] : []));
const pointsOf = (flat: readonly number[]) =>
  Array.from({ length: flat.length / 2 }, (_, i) => [flat[2 * i] ?? 0, flat[2 * i + 1] ?? 0] as const);

const onlyGlass = (glass = cementedPair()): Sketch => ({ ...emptySketch(), parts: [glass], stop: glass.id });

describe('glass', () => {
  const picture = pictureFor(withGlass());
  const { scene, view } = picture;

  it('is one outline for each piece, both sharing the cemented face', () => {
    const outlines = outlinesOf(drawn(picture, view, glassLayer));
    expect(outlines).toHaveLength(2);
    const [front = [], rear = []] = outlines.map((flat) => new Set(pointsOf(flat).map(String)));
    const shared = [...front].filter((point) => (rear as Set<string>).has(point));
    expect(shared.length).toBeGreaterThan(60);
  });

  it.each([1, 3, 0.2, 40])('follows the sphere √(R² − (z − R)²) at heights stretched ×%s', (stretch) => {
    const stretched = stretchBy(view, stretch);
    const [front = []] = outlinesOf(drawn(picture, stretched, glassLayer));
    const glass = scene.parts[1];
    for (const [x, y] of pointsOf(front).slice(0, 70)) {
      const heightMm = (yOf(stretched, 0) - y) / (stretched.pxPerMm * stretched.stretch);
      const sag = 61.47 - Math.sqrt(61.47 ** 2 - heightMm ** 2);
      expect(x).toBeCloseTo(xOf(stretched, (glass?.frontMm ?? 0) + sag), 3);
    }
  });

  it('is drawn as finely under deep zoom, where only a stretch of it is seen', () => {
    const deep = zoomAbout(view, xOf(view, scene.parts[1]?.frontMm ?? 0), 60);
    const outlines = outlinesOf(drawn(picture, deep, glassLayer));
    const seen = pointsOf(outlines[0] ?? []).filter(([, y]) => y > 0 && y < deep.heightPx);
    expect(seen.length).toBeGreaterThan(40);
    expect(outlines.flat().every((px) => Math.abs(px) < 30_000)).toBe(true);
  });

  it('joins faces of different rims by flats and a cylinder', () => {
    const stepped = cementedPair({
      surfaces: [surface(61.47, { semiDiameterMm: 8 }), surface(-44.64), surface(-129.94)],
    });
    const shown = pictureFor(onlyGlass(stepped));
    const [front = []] = outlinesOf(drawn(shown, shown.view, glassLayer));
    const ys = pointsOf(front).map(([, y]) => y);
    expect(Math.min(...ys)).toBeCloseTo(yOf(shown.view, 12), 6);
    const corners = pointsOf(front).filter(([, y]) => Math.abs(y - yOf(shown.view, 12)) < 1e-6);
    const sagAt8 = 61.47 - Math.sqrt(61.47 ** 2 - 64);
    expect(corners.map(([x]) => x)).toContainEqual(expect.closeTo(xOf(shown.view, sagAt8), 6));
  });

  it('ends where its conic ends, with words below it', () => {
    const short = cementedPair({
      surfaces: [surface(9), surface(null), surface(null)],
      fillings: [
        { thicknessMm: 14, material: { material: 'n-bk7' } },
        { thicknessMm: 2.5, material: { material: 'n-sf5' } },
      ],
    });
    const shown = pictureFor(onlyGlass(short));
    const face = shown.scene.parts[0]?.body?.faces[0];
    expect(face).toMatchObject({ semiMm: 12, ends: 'conic ends' });
    expect(face?.reachMm).toBeCloseTo(9, 6);
    expect(shown.labels).toContainEqual(
      expect.objectContaining({ id: 'fault:p2', text: 'ends inside its rim', style: 'label bad' }),
    );
  });

  it('is hatched where its faces have crossed, and only there', () => {
    const crossed = cementedPair({ surfaces: [surface(61.47), surface(-44.64), surface(-17)] });
    const shown = pictureFor(onlyGlass(crossed));
    const hatch = linesOf(
      drawn(shown, shown.view, (pen, of, at) => partsLayer(pen, of, at, null)),
      'hatch',
    );
    expect(hatch.length).toBeGreaterThan(4);
    // R −44.64 and −17, 2.5 apart on the axis, meet about 10.7 from it.
    for (const line of hatch)
      expect(Math.abs((line[1] ?? 0) - yOf(shown.view, 0))).toBeGreaterThan(
        yOf(shown.view, 0) - yOf(shown.view, 10.5),
      );
    const sound = drawn(picture, view, (pen, of, at) => partsLayer(pen, of, at, null));
    expect(linesOf(sound, 'hatch')).toEqual([]);
  });

  it('is outlined as strongly as any part when it is chosen or pointed at, its seams thinner', () => {
    const outlined = (selection: readonly PartId[], hovered: string | null) => {
      const shown = pictureFor(withGlass(), { selection });
      const marks = drawn(shown, shown.view, (pen, of, at) => partsLayer(pen, of, at, hovered));
      return [
        linesOf(marks, 'part selected'),
        linesOf(marks, 'part hover'),
        linesOf(marks, 'glass seam'),
      ].map(({ length }) => length);
    };
    const [, , seamsAtRest] = outlined([], null);
    expect(seamsAtRest).toBe(0);
    expect(outlined(['p2' as PartId], null)).toEqual([1, 0, 1]);
    expect(outlined([], 'p2')[2]).toBe(1);
  });

  it('is written to the file as it is drawn, with numbers alone', () => {
    const wild = withGlass(
      cementedPair({
        surfaces: [surface(5, { asphere: [1e30] }), surface(1e12), surface(-0.001, { conic: -1e6 })],
      }),
    );
    const shown = pictureFor(wild);
    const pen = svgPen({ widthPx: 1100, heightPx: 620, palette: PALETTES.paper, title: 'glass' });
    glassLayer(pen, shown.scene, shown.view);
    partsLayer(pen, shown.scene, shown.view, null);
    expect(pen.document()).not.toMatch(/NaN|Infinity|undefined/);
  });

  it('is called by its own focal length and measured as tall as its tallest face', () => {
    const part = scene.parts[1];
    expect(part?.semiMm).toBe(12);
    expect(part?.focalLengthMm).toBeGreaterThan(0);
    const label = picture.labels.find(({ id }) => id === 'part:p2');
    expect(label?.text).toMatch(/^f \d/);
  });
});
