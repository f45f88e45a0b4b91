import { none } from '../outcome.ts';
import type { Train } from '../train/types.ts';
import { derive, derive2, type Quantity } from './absence.ts';
import { type Axial, axialOf } from './axial.ts';
import { axisCrossing } from './scale.ts';
import { powerAt } from './trace.ts';

export type ConjugateKind = 'real' | 'virtual' | 'at infinity';

/** Object and image of one part by itself, as the axial light meets it. Lengths in mm. */
export interface LedgerRow {
  readonly partIndex: number;
  /** From the part's front vertex, negative for a real object; 'object at infinity'. */
  readonly objectDistanceMm: Quantity;
  /** From the part's rear vertex, positive for a real image; 'image at infinity'. */
  readonly imageDistanceMm: Quantity;
  readonly objectIs: ConjugateKind;
  readonly imageIs: ConjugateKind;
  /** Transverse, of this part alone: nu/nu′, which is 1 for a flat plate. */
  readonly magnification: Quantity;
  /** Transverse, from the first object to this image. */
  readonly runningMagnification: Quantity;
  /** The same distances, positive when real. */
  readonly realIsPositive: { readonly objectDistanceMm: Quantity; readonly imageDistanceMm: Quantity };
  /** The object and the image from the first surface. */
  readonly objectZ: Quantity;
  readonly imageZ: Quantity;
}

/**
 * The ledger: one row for every part that bends or shifts light (a plate as a whole; stops have none). Read from one
 * axial ray, so an image of an image passes through infinity and back without any case.
 */
export function conjugateChain(train: Train, axial: Axial = axialOf(train)): readonly LedgerRow[] {
  const rows: LedgerRow[] = [];
  for (let first = 0; first < train.count; ) {
    let behind = first + 1;
    while (behind < train.count && train.partOf[behind] === train.partOf[first]) behind++;
    if (acts(train, first, behind)) rows.push(rowOf(train, axial, first, behind));
    first = behind;
  }
  return rows;
}

/** A surface that neither bends nor ends a medium is a stop. */
function acts(train: Train, first: number, behind: number): boolean {
  for (let k = first; k < behind; k++) {
    if (powerAt(train, k) !== 0 || train.index[k] !== train.index[k + 1]) return true;
  }
  return false;
}

function rowOf(train: Train, { ray, scale }: Axial, first: number, behind: number): LedgerRow {
  const { index, z } = train;
  const nu = ray.nu[first]!;
  const nuAfter = ray.nu[behind]!;
  const object = axisCrossing(index[first]!, ray.y[first]!, nu, scale.nu[first]!, 'object at infinity');
  const image = axisCrossing(
    index[behind]!,
    ray.y[behind - 1]!,
    nuAfter,
    scale.nu[behind]!,
    'image at infinity',
  );
  // Light that runs to the left, behind a mirror, has its real objects on the right.
  const facing = Math.sign(index[first]!);
  const facingAfter = Math.sign(index[behind]!);
  const magnification = derive2(object, image, () => nu / nuAfter);
  const running =
    train.objectZ === null ? none('object at infinity' as const) : derive(image, () => ray.nu[0]! / nuAfter);
  return {
    partIndex: train.partOf[first]!,
    objectDistanceMm: object,
    imageDistanceMm: image,
    objectIs: !object.ok ? 'at infinity' : object.value * facing <= 0 ? 'real' : 'virtual',
    imageIs: !image.ok ? 'at infinity' : image.value * facingAfter >= 0 ? 'real' : 'virtual',
    magnification,
    runningMagnification: running,
    realIsPositive: {
      objectDistanceMm: derive(object, (distance) => -distance * facing),
      imageDistanceMm: derive(image, (distance) => distance * facingAfter),
    },
    objectZ: derive(object, (distance) => z[first]! + distance),
    imageZ: derive(image, (distance) => z[behind - 1]! + distance),
  };
}
