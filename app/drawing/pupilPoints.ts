import type { Analysis } from '../../engine/index.ts';

/** The rays of one field by where they go in the stop: shares of its radius along the marginal ray, in the meridian. */
export interface FieldPupil {
  /** Share of the largest field. */
  readonly share: number;
  readonly points: readonly number[];
}

/** The drawn rays of the axis point, as far as rims are known to let it through. */
export function axialPupil({ vignetting }: Analysis, count: number): readonly number[] {
  const onAxis = vignetting.ok ? vignetting.value.find(({ fraction }) => fraction === 0) : undefined;
  const limits = onAxis ? onAxis.meridian : { lower: -1, upper: 1 };
  return limits ? steps(count, limits.lower, limits.upper) : [];
}

/** The drawn rays of every field off the axis that rims let through, inner fields first. */
export function fieldPupils({ vignetting }: Analysis, count: number): readonly FieldPupil[] {
  if (!vignetting.ok) return [];
  return vignetting.value
    .flatMap(({ fraction, meridian }): FieldPupil[] =>
      fraction === 0 || meridian === null
        ? []
        : [{ share: fraction, points: steps(count, meridian.lower, meridian.upper) }],
    )
    .sort((a, b) => Math.abs(a.share) - Math.abs(b.share));
}

/** `count` points from `low` to `high`, ends included. */
function steps(count: number, low: number, high: number): number[] {
  if (count <= 1) return [(low + high) / 2];
  return Array.from({ length: count }, (_, i) => low + ((high - low) * i) / (count - 1));
}
