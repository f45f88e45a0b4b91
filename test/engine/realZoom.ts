import { emptySketch, newGlass, newSurface } from '../../engine/sketch/create.ts';
import type { GlassPart, PartId, PositionId, Sketch } from '../../engine/sketch/types.ts';
import cases from '../reference/cases.json' with { type: 'json' };

interface Row {
  readonly radius: number | null;
  readonly thickness: number;
  readonly index: number;
}

/** What a case of the reference file says: its rows, and the gap behind surface 5 at each position. */
const { input, expected } = cases.find(({ id }) => id === 'real-zoom-negative-positive') as unknown as {
  readonly input: {
    readonly prescription: { readonly surfaces: readonly Row[] };
    readonly positions: readonly { readonly name: string; readonly gaps: { readonly '5': number } }[];
  };
  readonly expected: Readonly<Record<string, { readonly value: number; readonly tolerance: number }>>;
};

/** The figures of the case by position and quantity, `wide.focalLength`. */
export const REAL_ZOOM_FIGURES = expected;

/**
 * The two-group zoom in real glass of the reference file as a sketch: seven lenses, three positions, the stop on the second lens of the
 * rear group, the image at the focus. Aperture and field are ours, as the case has none.
 */
export function realZoom(): Sketch {
  const { surfaces } = input.prescription;
  const positions = input.positions.map(({ name }) => ({ id: name as PositionId, name }));
  const parts: GlassPart[] = [];
  for (let k = 0; k < surfaces.length; k += 2) {
    const [front, rear] = surfaces.slice(k, k + 2) as [Row, Row];
    const zooming = k + 1 === 5;
    parts.push({
      ...newGlass(1, 1, `p${k / 2 + 1}` as PartId),
      surfaces: [newSurface(front.radius), newSurface(rear.radius)],
      fillings: [
        {
          thicknessMm: front.thickness,
          material: { name: `n ${front.index}`, index: front.index, abbeNumber: null },
        },
      ],
      space: {
        medium: 'air',
        lengthMm: zooming
          ? Object.fromEntries(input.positions.map(({ name, gaps }) => [name, gaps['5']]))
          : rear.thickness,
      },
    });
  }
  return {
    ...emptySketch('Real zoom'),
    parts,
    positions,
    stop: 'p5' as PartId,
    aperture: { kind: 'infinityFNumber', fNumber: 8 },
    field: { size: { kind: 'angle', angleDeg: 6 }, fractions: [0, 0.7, 1], vignetting: 0 },
  };
}
