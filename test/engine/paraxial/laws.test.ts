import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { axialOf } from '../../../engine/paraxial/axial.ts';
import { conjugates } from '../../../engine/paraxial/conjugates.ts';
import { firstOrder } from '../../../engine/paraxial/firstOrder.ts';
import { conjugateChain } from '../../../engine/paraxial/ledger.ts';
import { systemMatrix } from '../../../engine/paraxial/matrix.ts';
import { marginalRay, referenceRays } from '../../../engine/paraxial/rays.ts';
import { rayScale } from '../../../engine/paraxial/scale.ts';
import { powerAt, rayThrough } from '../../../engine/paraxial/trace.ts';
import { buildTrain } from '../../../engine/train/build.ts';
import type { ApertureAt } from '../../../engine/train/places.ts';
import { anyTrain, between, reversed, scaledBy } from '../anyTrain.ts';
import { given } from '../quantity.ts';

/** A few hundred roundings of the size of what was added. */
const ROUNDING = 1e-13;

const height = () => between(-20, 20);
const slope = () => between(-0.5, 0.5);

describe('any train', () => {
  it('keeps the Lagrange invariant of two rays through every surface', () => {
    fc.assert(
      fc.property(anyTrain(), height(), slope(), height(), slope(), (spec, y, u, yBar, uBar) => {
        const train = buildTrain(spec);
        const [one, other] = [rayThrough(train, 0, y, u), rayThrough(train, 0, yBar, uBar)];
        const [oneScale, otherScale] = [rayScale(train, 0, y, u), rayScale(train, 0, yBar, uBar)];
        const invariant = u * yBar - uBar * y;
        for (let k = 0; k < train.count; k++) {
          for (const space of [k, k + 1]) {
            const here = one.nu[space]! * other.y[k]! - other.nu[space]! * one.y[k]!;
            const scale = oneScale.nu[space]! * otherScale.y[k]! + otherScale.nu[space]! * oneScale.y[k]!;
            expect(Math.abs(here - invariant)).toBeLessThanOrEqual(ROUNDING * scale);
          }
        }
      }),
    );
  });

  it('has a matrix of determinant 1 between any two surfaces', () => {
    fc.assert(
      fc.property(anyTrain(), fc.nat(), fc.nat(), (spec, one, other) => {
        const train = buildTrain(spec);
        const [from, to] = [one % train.count, other % (train.count + 1)].sort((a, b) => a - b) as [
          number,
          number,
        ];
        const m = systemMatrix(train, from, to);
        const scale = m.aScale * m.dScale + m.bScale * m.cScale;
        expect(Math.abs(m.a * m.d - m.b * m.c - 1)).toBeLessThanOrEqual(ROUNDING * scale);
      }),
    );
  });

  it('sends a ray back the way it came', () => {
    fc.assert(
      fc.property(anyTrain(), height(), slope(), (spec, y, u) => {
        const train = buildTrain(spec);
        const there = rayThrough(train, 0, y, u);
        const last = train.count - 1;
        const mirrored = buildTrain(reversed(spec));
        const [start, startNu] = [there.y[last]!, -there.nu[train.count]!];
        const back = rayThrough(mirrored, 0, start, startNu);
        const scale = rayScale(mirrored, 0, start, startNu);
        const scaleThere = rayScale(train, 0, y, u);
        for (let k = 0; k < train.count; k++) {
          // What is lost on the way out is carried back as well, so both ways count.
          const carried = Math.max(scale.y[last - k]!, scaleThere.y[k]!);
          expect(Math.abs(back.y[last - k]! - there.y[k]!)).toBeLessThanOrEqual(1e-12 * carried);
        }
      }),
    );
  });

  it('has the same matrix from behind with its diagonal exchanged', () => {
    fc.assert(
      fc.property(anyTrain(), (spec) => {
        const there = systemMatrix(buildTrain(spec));
        const back = systemMatrix(buildTrain(reversed(spec)));
        expect(Math.abs(back.a - there.d)).toBeLessThanOrEqual(ROUNDING * (back.aScale + there.dScale));
        expect(Math.abs(back.b - there.b)).toBeLessThanOrEqual(ROUNDING * (back.bScale + there.bScale));
        expect(Math.abs(back.c - there.c)).toBeLessThanOrEqual(ROUNDING * (back.cScale + there.cScale));
      }),
    );
  });

  it('scales its lengths with the drawing and keeps its magnifications', () => {
    // Powers of two change no digits, so equality is exact.
    fc.assert(
      fc.property(anyTrain(), fc.constantFrom(1 / 1024, 0.5, 4, 2048), (spec, factor) => {
        const [train, scaled] = [buildTrain(spec), buildTrain(scaledBy(spec, factor))];
        const [one, other] = [firstOrder(train), firstOrder(scaled)];
        expect(other.afocal).toBe(one.afocal);
        const lengths = [
          'focalLengthMm',
          'backFocusMm',
          'frontFocusMm',
          'principalFrontMm',
          'nodalRearMm',
        ] as const;
        for (const name of lengths) {
          const [value, wanted] = [other[name], one[name]];
          expect(value).toEqual(wanted.ok ? { ok: true, value: wanted.value * factor } : wanted);
        }
        expect(other.angularMagnification).toEqual(one.angularMagnification);
        const [ends, scaledEnds] = [conjugates(train), conjugates(scaled)];
        expect(scaledEnds.magnification).toEqual(ends.magnification);
        expect(scaledEnds.trackMm).toEqual(
          ends.trackMm.ok ? { ok: true, value: ends.trackMm.value * factor } : ends.trackMm,
        );
      }),
    );
  });

  it('forms by the ledger the image that its matrix gives', () => {
    fc.assert(
      fc.property(anyTrain(), (spec) => {
        const train = buildTrain(spec);
        const ledger = conjugateChain(train);
        const last = ledger.at(-1);
        const surface = last?.partIndex ?? -1;
        const { a, b, c, d, aScale, bScale, cScale, dScale } = systemMatrix(train);
        const image = conjugates(train).imageDistanceMm;
        // A diaphragm behind the last row would shift the vertex that the distance is counted from.
        fc.pre(surface === train.count - 1);
        expect(last?.imageDistanceMm.ok).toBe(image.ok);
        if (!last?.imageDistanceMm.ok || !image.ok) return;
        const reduced = train.objectZ === null ? null : -train.objectZ / train.index[0]!;
        const [y, nu] = reduced === null ? [a, c] : [a * reduced + b, c * reduced + d];
        const [yScale, nuScale] =
          reduced === null ? [aScale, cScale] : [aScale * reduced + bScale, cScale * reduced + dScale];
        const n = train.index[train.count]!;
        const byMatrix = (-n * y) / nu;
        const scale = ((n * yScale) / Math.abs(nu)) * (nuScale / Math.abs(nu));
        expect(Math.abs(last.imageDistanceMm.value - byMatrix)).toBeLessThanOrEqual(ROUNDING * scale);
        if (reduced === null) return;
        expect(Math.abs(given(last.runningMagnification) * nu - 1)).toBeLessThanOrEqual(
          (ROUNDING * nuScale) / Math.abs(nu),
        );
      }),
    );
  });

  it('passes the image of each part on to the next as its object, by the lens equation', () => {
    fc.assert(
      fc.property(anyTrain(), (spec) => {
        const train = buildTrain(spec);
        const { scale, ray } = axialOf(train);
        for (const row of conjugateChain(train)) {
          if (!row.objectDistanceMm.ok || !row.imageDistanceMm.ok) continue;
          const k = row.partIndex;
          // n′/s′ = n/s + φ, each term as large as nu/y.
          const object = train.index[k]! / row.objectDistanceMm.value;
          const image = train.index[k + 1]! / row.imageDistanceMm.value;
          const y = Math.abs(ray.y[k]!);
          if (y <= 1e-9 * scale.y[k]!) continue;
          const size = (scale.nu[k]! + scale.nu[k + 1]!) / y + Math.abs(powerAt(train, k));
          expect(Math.abs(image - object - powerAt(train, k))).toBeLessThanOrEqual(
            (1e-12 * size * scale.y[k]!) / y,
          );
        }
      }),
    );
  });

  it('multiplies the magnifications of its parts to that of the whole', () => {
    fc.assert(
      fc.property(anyTrain(), (spec) => {
        const train = buildTrain(spec);
        const ledger = conjugateChain(train);
        fc.pre(train.objectZ !== null && ledger.every((row) => row.magnification.ok));
        const product = ledger.reduce((m, row) => m * given(row.magnification), 1);
        const whole = given(conjugates(train).magnification);
        expect(Math.abs(product / whole - 1)).toBeLessThanOrEqual(1e-12);
      }),
    );
  });
});

describe('moving the stop', () => {
  const apertures: readonly ApertureAt[] = [
    { kind: 'stopDiameter', diameterMm: 4 },
    { kind: 'entrancePupilDiameter', diameterMm: 4 },
    { kind: 'infinityFNumber', fNumber: 4 },
    { kind: 'workingFNumber', fNumber: 4 },
    { kind: 'objectNA', na: 0.1 },
  ];

  it('only scales the marginal ray, and not at all when the light itself is given', () => {
    fc.assert(
      fc.property(anyTrain(), fc.nat(), fc.constantFrom(...apertures), (spec, place, aperture) => {
        const train = buildTrain(spec);
        const moved = buildTrain({ ...spec, stopSurface: place % train.count });
        const [one, other] = [marginalRay(train, aperture), marginalRay(moved, aperture)];
        if (!one.ok || !other.ok) return;
        const [ray, movedRay] = [one.value, other.value];
        const { ray: base } = axialOf(train);
        const start = base.y[0] !== 0 ? base.y[0]! : base.nu[0]!;
        const factor = (base.y[0] !== 0 ? movedRay.y[0]! : movedRay.nu[0]!) / start;
        const own = (base.y[0] !== 0 ? ray.y[0]! : ray.nu[0]!) / start;
        for (let k = 0; k < train.count; k++) {
          const [got, wanted] = [movedRay.y[k]! * own, ray.y[k]! * factor];
          expect(Math.abs(got - wanted)).toBeLessThanOrEqual(ROUNDING * Math.abs(wanted));
        }
        if (aperture.kind === 'workingFNumber' || aperture.kind === 'objectNA') expect(movedRay).toEqual(ray);
      }),
    );
  });

  it('adds a share of the marginal ray to the chief ray', () => {
    fc.assert(
      fc.property(anyTrain(), fc.nat(), (spec, place) => {
        const aperture: ApertureAt = { kind: 'objectNA', na: 0.1 };
        const field = { kind: 'objectHeight', heightMm: 5 } as const;
        const [one, other] = [spec.stopSurface, place % spec.surfaces.length].map((stopSurface) =>
          referenceRays(buildTrain({ ...spec, stopSurface: stopSurface ?? 0 }), aperture, field),
        );
        fc.pre(!!one?.chief.ok && !!other?.chief.ok && one.marginal.ok);
        const [chief, moved, marginal] = [given(one?.chief), given(other?.chief), given(one?.marginal)];
        const share = (moved.nu[0]! - chief.nu[0]!) / marginal.nu[0]!;
        // The share is a difference of slopes: it carries the rounding of both.
        const slopes = (Math.abs(moved.nu[0]!) + Math.abs(chief.nu[0]!)) / Math.abs(marginal.nu[0]!);
        const size = Math.max(
          ...[...chief.y, ...moved.y, ...marginal.y.map((y) => slopes * y)].map(Math.abs),
        );
        for (let k = 0; k < chief.y.length; k++) {
          expect(Math.abs(moved.y[k]! - chief.y[k]! - share * marginal.y[k]!)).toBeLessThanOrEqual(
            1e-9 * size,
          );
        }
      }),
    );
  });
});
