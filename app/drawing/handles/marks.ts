import { xOf, yOf } from '../../board/viewport.ts';
import { type Handle, readOnly } from '../handle.ts';
import type { ScenePlane } from '../scene.ts';
import type { Sight } from '../sight.ts';
import { imageName } from '../words.ts';

/** Images between the parts, pupils, principal planes and focal points: to be pointed at, not to be moved. */
export function markHandles({ scene, view }: Sight): readonly Handle[] {
  const between = (zMm: number, oneMm: number, otherMm: number) => {
    const ends = [yOf(view, oneMm), yOf(view, otherMm)] as const;
    const line = { topPx: Math.min(...ends), bottomPx: Math.max(...ends) };
    return { xPx: xOf(view, zMm), yPx: yOf(view, 0), line };
  };
  return [
    ...scene.images.map((image) => {
      const why = `The ${imageName(image, scene)} follows from the parts in front of it.`;
      return readOnly(
        `image:${image.partIndex}`,
        imageName(image, scene),
        why,
        between(image.zMm, 0, image.heightMm),
      );
    }),
    ...scene.planes.map(({ name, zMm, semiMm }) => {
      const reachMm = name.endsWith('focus') ? 0 : (semiMm ?? scene.tallestMm);
      return readOnly(name, name, WHY[name], between(zMm, reachMm, -reachMm));
    }),
  ];
}

const WHOLE = 'follows from the whole layout: powers and gaps.';
const WHY: Readonly<Record<ScenePlane['name'], string>> = {
  'entrance pupil': 'The entrance pupil is the image of the stop by the parts in front of it.',
  'exit pupil': 'The exit pupil is the image of the stop by the parts behind it.',
  'front principal plane': `The front principal plane ${WHOLE}`,
  'rear principal plane': `The rear principal plane ${WHOLE}`,
  'front focus': `The front focus ${WHOLE}`,
  'rear focus': `The rear focus ${WHOLE}`,
};
