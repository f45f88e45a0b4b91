import type { Pen } from '../../board/pen.ts';
import { fieldBundle, type MarkStyle, type RayName } from '../../board/styles.ts';
import type { Viewport } from '../../board/viewport.ts';
import { xOf, yOf } from '../../board/viewport.ts';
import { onScreen } from '../project.ts';
import type { ExactPencil, ExactRays } from './rays.ts';

/** Nearer than this, px, a paraxial ray is the exact one to the eye. */
const SAME_PX = 0.4;
const CROSS_PX = 4;

/** Which of both kinds of rays are shown. */
export interface BothShown {
  readonly paraxial: boolean;
  readonly exact: boolean;
}

/**
 * Exact rays solid, and paraxial ones dashed over them where they run apart; each kind of ray in two paths at most. Where exact rays are
 * lost stands a cross.
 */
export function exactRaysLayer(pen: Pen, rays: ExactRays, shown: BothShown, view: Viewport): void {
  for (const [pencil, style] of styled(rays)) pencilLayer(pen, pencil, style, shown, view);
  if (shown.exact) lostLayer(pen, rays, view);
}

/** Every pencil with the style of its rays. */
function styled({ pencils }: ExactRays): readonly (readonly [ExactPencil, RayName])[] {
  const fields = pencils.filter(({ name }) => name === 'off-axis bundle').length;
  return pencils.map((pencil, i) => [
    pencil,
    pencil.name === 'off-axis bundle' ? fieldBundle(i, fields) : pencil.name,
  ]);
}

/** Draws one pencil with its exact rays in `style`. */
export function pencilLayer(
  pen: Pen,
  { rays }: Pick<ExactPencil, 'rays'>,
  style: RayName,
  shown: BothShown,
  view: Viewport,
): void {
  const solid = new Lines();
  const dashed = new Lines();
  for (const ray of rays) {
    const exact = onScreen(view, ray.exact);
    if (shown.exact) solid.add(exact);
    if (!shown.paraxial) continue;
    const paraxial = onScreen(view, ray.paraxial);
    if (shown.exact) addWhereApart(dashed, paraxial, exact);
    else dashed.add(paraxial);
  }
  solid.draw(pen, style);
  dashed.draw(pen, `${style} paraxial`);
}

/** Lines of one style as the pen takes them. */
class Lines {
  readonly #points: number[] = [];
  readonly #starts: number[] = [];

  add(line: ArrayLike<number>, from = 0, to = line.length): void {
    if (to - from < 4) return;
    this.#starts.push(this.#points.length / 2);
    for (let i = from; i < to; i++) this.#points.push(line[i] ?? 0);
  }

  draw(pen: Pen, style: MarkStyle): void {
    if (this.#starts.length > 0) pen.polylines(this.#points, this.#starts, style);
  }
}

/** Adds the stretches of a paraxial ray that do not lie on the exact ray's stretch in the same space. */
function addWhereApart(lines: Lines, paraxial: Float64Array, exact: Float64Array): void {
  let from = -1;
  for (let i = 0; i + 3 < paraxial.length; i += 2) {
    const same = i + 3 < exact.length && liesOn(paraxial, exact, i);
    if (!same && from < 0) from = i;
    if (same && from >= 0) {
      lines.add(paraxial, from, i + 2);
      from = -1;
    }
  }
  if (from >= 0) lines.add(paraxial, from);
}

/** Whether both ends of the stretch from place `i` are near the straight line of the other's. */
function liesOn(line: Float64Array, other: Float64Array, i: number): boolean {
  const [x1 = 0, y1 = 0, x2 = 0, y2 = 0] = other.subarray(i, i + 4);
  const length = Math.hypot(x2 - x1, y2 - y1);
  for (let k = i; k <= i + 2; k += 2) {
    const [dx, dy] = [(line[k] ?? 0) - x1, (line[k + 1] ?? 0) - y1];
    const apart = length < SAME_PX ? Math.hypot(dx, dy) : Math.abs(dx * (y2 - y1) - dy * (x2 - x1)) / length;
    if (!(apart <= SAME_PX)) return false;
  }
  return true;
}

/** A cross where each lost ray ends. */
function lostLayer(pen: Pen, rays: ExactRays, view: Viewport): void {
  const crosses = new Lines();
  for (const { zMm, yMm } of lostPlaces(rays)) {
    const [x, y] = [xOf(view, zMm), yOf(view, yMm)];
    crosses.add([x - CROSS_PX, y - CROSS_PX, x + CROSS_PX, y + CROSS_PX]);
    crosses.add([x - CROSS_PX, y + CROSS_PX, x + CROSS_PX, y - CROSS_PX]);
  }
  crosses.draw(pen, 'lost');
}

/** Where rays are lost, and the rays. */
export function lostPlaces({ pencils }: ExactRays) {
  return pencils.flatMap((pencil) =>
    pencil.rays.flatMap(({ lost, exact }) => {
      const [zMm, yMm] = [exact.at(-2), exact.at(-1)];
      return lost && zMm !== undefined && yMm !== undefined ? [{ pencil, lost, zMm, yMm }] : [];
    }),
  );
}
