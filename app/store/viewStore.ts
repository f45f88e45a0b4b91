import { createStore } from 'zustand/vanilla';
import type { Datum, LengthUnit, PartId, PartKind, Setting, Sketch, SumName } from '../../engine/index.ts';

/** What can be selected: parts by id, and the two ends of the axis. */
export type Selected = PartId | 'object' | 'image';

export type ThemeChoice = 'system' | 'paper' | 'night';
export type PlotDrawer = 'fans' | 'wavefront' | 'spots' | 'field' | 'contrast' | 'colour' | 'sums';
export type Drawer = 'ledger' | 'table' | 'trace' | PlotDrawer;
/** The sheets that lie over the page, one at a time. */
export type Sheet = 'help' | 'handOver' | 'shelf' | 'starters' | 'prescription';

/** What the drawing shows besides parts and rays. */
export interface Shown {
  readonly bundles: boolean;
  readonly images: boolean;
  readonly pupils: boolean;
  readonly principalPlanes: boolean;
  readonly focalPoints: boolean;
  /** The ribbon measures glass between its principal planes, as the thin part that it stands for. */
  readonly equivalentGaps: boolean;
  readonly labels: boolean;
}

/** Where the drawing looks. `follow` re-fits by itself until the user pans or zooms. */
export interface Camera {
  readonly follow: 'parts' | 'everything' | null;
  readonly originMm: number;
  readonly pxPerMm: number;
  /** Heights are drawn at pxPerMm × stretch. */
  readonly stretch: number;
  readonly axisYPx: number;
}

/** What is being taken from the tray: a thin element of either sign, a stop or a plate. */
export type TrayKind = 'positive' | 'negative' | Exclude<PartKind, 'thin'>;

/** How exact rays are shown beside paraxial ones. */
export interface ExactView {
  readonly paraxial: boolean;
  readonly exact: boolean;
  /** Drift whiskers at the surfaces, drawn so many times as long as the drift is. */
  readonly whiskers: boolean;
  readonly stretch: number;
  /** Drift beyond this is flagged, mm. */
  readonly driftLimitMm: number;
  /** Whether the largest drift is pointed at. */
  readonly largest: boolean;
  /** How far exact and paraxial may land apart for the first order to be trusted, mm. */
  readonly trustLimitMm: number;
}

/** The magnifier on the drawing. */
export interface LoupeView {
  readonly shown: boolean;
  /** Where it looks, from the first vertex; null is the image plane. */
  readonly zMm: number | null;
  /** The height it looks at; null is the end of the field. */
  readonly heightMm: number | null;
  /** From the middle of what it shows to the plane through focus, mm. */
  readonly planeMm: number;
  /** Times real size on a screen of 96 px to the inch; null fits what is there. */
  readonly lengths: number | null;
  readonly heights: number | null;
}

/** What the plots under the drawing show. */
export interface PlotsView {
  /** All positions side by side, not only the one in view. */
  readonly all: boolean;
  readonly spots: 'plane' | 'throughFocus';
  readonly distortion: 'paraxial' | 'fTheta';
  /** Which sum hangs under the surfaces. */
  readonly sum: SumName;
}

/** How the user looks at the sketch. Nothing in it changes the sketch. */
export interface View {
  readonly setting: Setting;
  readonly selection: readonly Selected[];
  readonly camera: Camera;
  readonly theme: ThemeChoice;
  readonly unit: LengthUnit;
  readonly drawer: Drawer | null;
  /** Which readout the trace sheet explains, by its id. */
  readonly topic: string;
  readonly plots: PlotsView;
  /** The surface that a plot points at: it is lit up on the drawing. */
  readonly glow: number | null;
  readonly sheet: Sheet | null;
  readonly shown: Shown;
  readonly raysPerBundle: number;
  readonly exact: ExactView;
  readonly loupe: LoupeView;
  readonly realIsPositive: boolean;
  readonly snap: boolean;
  /** The phone's stand-in for Shift. */
  readonly otherRule: boolean;
  readonly foldedGroups: readonly string[];
  readonly datum: Datum;
  readonly digits: number;
  /** Shortened first-run hints; false once dismissed. */
  readonly hints: boolean;
  /** The panel opened as a sheet on a narrow screen. */
  readonly panel: 'readouts' | 'part' | 'sketch' | 'plots' | 'warnings' | null;
  /** What waits to be set down on the axis. */
  readonly placing: TrayKind | null;
  /** The thin part whose card asks what glass it shall become. */
  readonly thickening: PartId | null;
  /** The grip whose number is being typed on the drawing. */
  readonly typing: string | null;
}

const start: View = {
  setting: { at: '' as Setting['at'], toNext: 0 },
  selection: [],
  camera: { follow: 'parts', originMm: 0, pxPerMm: 5, stretch: 1, axisYPx: 300 },
  theme: 'system',
  unit: 'mm',
  drawer: null,
  topic: 'focalLength',
  plots: { all: false, spots: 'plane', distortion: 'paraxial', sum: 'spherical' },
  glow: null,
  sheet: null,
  shown: {
    bundles: true,
    images: true,
    pupils: false,
    principalPlanes: false,
    focalPoints: false,
    equivalentGaps: false,
    labels: true,
  },
  raysPerBundle: 5,
  exact: {
    paraxial: true,
    exact: true,
    whiskers: false,
    stretch: 20,
    driftLimitMm: 0.1,
    largest: false,
    trustLimitMm: 0.01,
  },
  loupe: { shown: false, zMm: null, heightMm: null, planeMm: 0, lengths: null, heights: null },
  realIsPositive: false,
  snap: true,
  otherRule: false,
  foldedGroups: [],
  datum: 'first part',
  digits: 3,
  hints: true,
  panel: null,
  placing: null,
  thickening: null,
  typing: null,
};

export const viewStore = createStore<View>(() => start);

/** Changes some of the view. */
export const setView = (change: Partial<View>): void => viewStore.setState(change);

/** Selects exactly these. */
export const select = (...selection: readonly Selected[]): void => setView({ selection });

/** The setting of `view`, or the first position when the sketch does not hold that position. */
export function settingIn(sketch: Sketch, view: View): Setting {
  const known = sketch.positions.some((position) => position.id === view.setting.at);
  const first = sketch.positions[0];
  return known || !first ? view.setting : { at: first.id, toNext: 0 };
}

/** The selected parts that the sketch still holds, in the sketch's order. */
export function selectedParts(sketch: Sketch, view: View): readonly PartId[] {
  const chosen = new Set<string>(view.selection);
  return sketch.parts.map((part) => part.id).filter((id) => chosen.has(id));
}
