import * as v from 'valibot';
import { SUM_NAMES } from '../../engine/index.ts';
import type { Drawer, View } from '../store/viewStore.ts';

/** The parts of the view that are there again after a reload. */
const KEPT = [
  'theme',
  'unit',
  'shown',
  'raysPerBundle',
  'exact',
  'loupe',
  'realIsPositive',
  'snap',
  'hints',
  'digits',
  'datum',
  'drawer',
  'topic',
  'plots',
  'foldedGroups',
  'setting',
  'selection',
] as const satisfies readonly (keyof View)[];

export type KeptView = Pick<View, (typeof KEPT)[number]>;

/** What of `view` is kept. */
export function keptViewOf(view: View): KeptView {
  return Object.fromEntries(KEPT.map((field) => [field, view[field]])) as KeptView;
}

const flag = v.boolean();
const count = (from: number, to: number) => v.pipe(v.number(), v.integer(), v.minValue(from), v.maxValue(to));
const number = v.pipe(v.number(), v.finite());
const positive = v.pipe(number, v.minValue(0));
const texts = v.array(v.string());

const DRAWERS = [
  'fans',
  'wavefront',
  'spots',
  'field',
  'contrast',
  'colour',
  'sums',
  'ledger',
  'trace',
  'table',
] as const satisfies readonly Drawer[];

/** Each field by itself, so that one that is broken or from another version does not cost the rest. */
const fields = {
  theme: v.picklist(['system', 'paper', 'night']),
  unit: v.picklist(['mm', 'in']),
  shown: v.object({
    bundles: flag,
    images: flag,
    pupils: flag,
    principalPlanes: flag,
    focalPoints: flag,
    equivalentGaps: v.optional(flag, false),
    labels: flag,
  }),
  raysPerBundle: count(1, 99),
  exact: v.object({
    paraxial: flag,
    exact: flag,
    whiskers: flag,
    stretch: positive,
    driftLimitMm: positive,
    largest: flag,
    trustLimitMm: positive,
  }),
  loupe: v.object({
    shown: flag,
    zMm: v.nullable(number),
    heightMm: v.nullable(number),
    planeMm: number,
    lengths: v.nullable(positive),
    heights: v.nullable(positive),
  }),
  realIsPositive: flag,
  snap: flag,
  hints: flag,
  digits: count(0, 6),
  datum: v.picklist(['first part', 'sensor', 'mount']),
  drawer: v.nullable(v.picklist(DRAWERS)),
  topic: v.string(),
  plots: v.object({
    all: flag,
    spots: v.picklist(['plane', 'throughFocus']),
    distortion: v.picklist(['paraxial', 'fTheta']),
    sum: v.picklist(SUM_NAMES),
  }),
  foldedGroups: texts,
  setting: v.object({ at: v.string(), toNext: v.pipe(v.number(), v.minValue(0), v.ltValue(1)) }),
  selection: texts,
} satisfies Record<(typeof KEPT)[number], v.GenericSchema>;

/** What of `data` can be a view; fields that are absent or broken are left out. Never throws. */
export function viewFrom(data: unknown): Partial<KeptView> {
  if (typeof data !== 'object' || data === null) return {};
  const good: Record<string, unknown> = {};
  for (const field of KEPT) {
    const result = v.safeParse(fields[field], (data as Record<string, unknown>)[field]);
    if (result.success) good[field] = result.output;
  }
  return good as Partial<KeptView>;
}
