/** The rays that have a look of their own. Solid is a real (or the only) ray. */
export type RayName =
  | 'marginal ray'
  | 'chief ray'
  | 'axial bundle'
  | 'field inner bundle'
  | 'field middle bundle'
  | 'field outer bundle';

/** Dotted for a backward extension; dashed for a paraxial ray beside its exact one. */
export type RayStyle = RayName | `${RayName} virtual` | `${RayName} paraxial`;

/** What a curve of a plot stands for, by which it has its colour. */
export type CurveInk = 'axial' | 'field inner' | 'field middle' | 'field outer' | 'ink' | 'quiet';
/** The line of its light, or the member of a family, by which it has its dash. */
export type CurveLine = 'main' | 'short' | 'long' | 'fourth' | 'fifth';
type CurveStyle = `curve ${CurveInk} ${CurveLine}` | `dots ${CurveInk}`;

/** Looks of lines and outlines, named by what they mean. */
export type MarkStyle =
  | RayStyle
  | CurveStyle
  | 'axis'
  | 'part'
  | 'part hover'
  | 'part selected'
  | 'part quiet'
  | 'glass'
  | 'glass seam'
  | 'room'
  | 'stop'
  | 'stop hover'
  | 'sensor'
  | 'sensor hover'
  | 'mount'
  | 'object'
  | 'object virtual'
  | 'image'
  | 'image virtual'
  | 'pupil'
  | 'pupil virtual'
  | 'principal plane'
  | 'focal point'
  | 'fold'
  | 'leader'
  | 'dimension'
  | 'dimension hover'
  | 'dimension quiet'
  | 'dimension tick'
  | 'dimension bad'
  | 'dimension held'
  | 'hatch'
  | 'bad'
  | 'held'
  | 'held pin'
  | 'grip'
  | 'grip hover'
  | 'grip hollow'
  | 'grip focus'
  | 'snap'
  | 'former place'
  | 'drop place'
  | 'scale bar'
  | 'underlay'
  | 'grid'
  | 'curve'
  | 'curve quiet'
  | 'curve reference'
  | 'Airy disc'
  | 'glow'
  | 'paper'
  | 'ink'
  | 'lost'
  | 'drift'
  | 'drift beyond'
  | 'loupe ring'
  | 'loupe target'
  | 'loupe plane'
  | 'loupe airy';

/** Looks of texts. */
export type TextStyle =
  | 'label'
  | 'label strong'
  | 'label quiet'
  | 'label marginal ray'
  | 'label chief ray'
  | 'label held'
  | 'label bad'
  | 'label snap'
  | 'value'
  | 'value strong'
  | 'value held'
  | 'value bad'
  | 'value quiet';

export type ColourToken =
  | 'paper'
  | 'ink'
  | 'quiet'
  | 'line'
  | 'axial'
  | 'chief'
  | 'field inner'
  | 'field middle'
  | 'field outer'
  | 'held'
  | 'glass'
  | 'glass edge'
  | 'bad'
  | 'chosen';

/** Stroke width in px, or 'hairline': one device pixel. `null` colours draw nothing. */
export interface MarkLook {
  readonly stroke: ColourToken | null;
  readonly fill: ColourToken | null;
  readonly width: number | 'hairline';
  readonly dash: readonly number[];
  /** Whether straight upright or level lines are set on whole device pixels. */
  readonly crisp: boolean;
}

export interface TextLook {
  readonly colour: ColourToken;
  readonly sizePx: number;
  readonly weight: number;
}

export type ThemeName = 'paper' | 'night' | 'forced';
export type Palette = Readonly<Record<ColourToken, string>>;

/** Colours by meaning in the three themes; `forced` leaves them to the system. */
export const PALETTES: Readonly<Record<ThemeName, Palette>> = {
  paper: {
    paper: '#fbfaf6',
    ink: '#1c2530',
    quiet: '#5d6875',
    line: '#d5d6d0',
    axial: '#0a71b1',
    chief: '#7c1257',
    'field inner': '#5e3f00',
    'field middle': '#8a6212',
    'field outer': '#b08630',
    held: '#c2410c',
    glass: '#dfeaf0',
    'glass edge': '#47637a',
    bad: '#8f1230',
    chosen: '#1c2530',
  },
  night: {
    paper: '#12171d',
    ink: '#e5e9ec',
    quiet: '#98a3af',
    line: '#333c47',
    axial: '#56b4f5',
    chief: '#e2528b',
    'field inner': '#fae3ad',
    'field middle': '#d2a64c',
    'field outer': '#957430',
    held: '#ff9a6b',
    glass: '#1f303d',
    'glass edge': '#8fb0c6',
    bad: '#ffc0c4',
    chosen: '#e5e9ec',
  },
  forced: {
    paper: 'Canvas',
    ink: 'CanvasText',
    quiet: 'CanvasText',
    line: 'GrayText',
    axial: 'CanvasText',
    chief: 'CanvasText',
    'field inner': 'CanvasText',
    'field middle': 'CanvasText',
    'field outer': 'CanvasText',
    held: 'Highlight',
    glass: 'Canvas',
    'glass edge': 'CanvasText',
    bad: 'CanvasText',
    chosen: 'Highlight',
  },
};

/** The type face of everything drawn. */
export const FONT_FAMILY = "'Source Sans 3 Variable', 'Source Sans 3', 'Segoe UI', system-ui, sans-serif";

const DOTTED = [1.5, 3];
const DASHED = [7, 4];
const CHAIN = [14, 3, 2, 3];

const RAYS: Readonly<Record<RayName, MarkLook>> = {
  'marginal ray': line('axial', 1.5),
  'chief ray': line('chief', 2),
  'axial bundle': line('axial', 'hairline'),
  'field inner bundle': line('field inner', 'hairline'),
  'field middle bundle': line('field middle', 'hairline'),
  'field outer bundle': line('field outer', 'hairline'),
};

const MARKS: Readonly<Record<Exclude<MarkStyle, RayStyle | CurveStyle>, MarkLook>> = {
  axis: crisp('quiet', 'hairline', CHAIN),
  part: crisp('ink', 1.6),
  'part hover': crisp('ink', 2.1),
  'part selected': crisp('chosen', 2.4),
  'part quiet': crisp('quiet', 1.2),
  glass: outlined('glass edge', 'glass', 1.2),
  'glass seam': line('glass edge', 1.6),
  room: crisp('quiet', 'hairline', DOTTED),
  stop: crisp('ink', 2.2),
  'stop hover': crisp('ink', 2.7),
  sensor: crisp('ink', 3),
  'sensor hover': crisp('ink', 3.5),
  mount: crisp('quiet', 1, CHAIN),
  object: crisp('ink', 1.4),
  'object virtual': line('quiet', 1.2, DOTTED),
  image: crisp('quiet', 1.4),
  'image virtual': line('quiet', 1.2, DOTTED),
  pupil: crisp('quiet', 1.4),
  'pupil virtual': line('quiet', 1.4, DOTTED),
  'principal plane': crisp('quiet', 'hairline', [6, 2, 2, 2, 2, 2]),
  'focal point': outlined('ink', 'paper', 1.4),
  fold: line('quiet', 1.2),
  leader: crisp('quiet', 'hairline'),
  dimension: crisp('ink', 1.2),
  'dimension hover': crisp('ink', 1.7),
  'dimension quiet': crisp('quiet', 'hairline'),
  'dimension tick': line('ink', 1.6),
  'dimension bad': crisp('bad', 1.6),
  'dimension held': crisp('held', 1.4),
  hatch: line('bad', 'hairline'),
  bad: line('bad', 1.6),
  held: line('held', 1.6),
  'held pin': outlined('held', 'held', 1.4),
  grip: outlined('ink', 'paper', 1.6),
  'grip hover': outlined('ink', 'ink', 1.6),
  'grip hollow': outlined('quiet', null, 1.4),
  'grip focus': line('chosen', 2),
  snap: line('chosen', 1.2),
  'former place': crisp('quiet', 'hairline', DOTTED),
  'drop place': crisp('ink', 1.2),
  'scale bar': crisp('quiet', 1.2),
  underlay: line('line', 'hairline'),
  grid: crisp('line', 'hairline'),
  curve: line('ink', 1.6),
  'curve quiet': line('quiet', 1),
  'curve reference': line('quiet', 'hairline'),
  'Airy disc': line('quiet', 1, [4, 3]),
  glow: line('glass edge', 5),
  paper: outlined(null, 'paper', 0),
  ink: outlined(null, 'ink', 0),
  lost: line('bad', 1.6),
  drift: crisp('ink', 1.6),
  'drift beyond': crisp('bad', 2),
  'loupe ring': line('ink', 1.6),
  'loupe target': line('ink', 1.2),
  'loupe plane': crisp('ink', 1, DOTTED),
  'loupe airy': line('ink', 1.4),
};

const TEXTS: Readonly<Record<TextStyle, TextLook>> = {
  label: { colour: 'ink', sizePx: 13, weight: 400 },
  'label strong': { colour: 'ink', sizePx: 13, weight: 600 },
  'label quiet': { colour: 'quiet', sizePx: 12.5, weight: 400 },
  'label marginal ray': { colour: 'axial', sizePx: 12.5, weight: 550 },
  'label chief ray': { colour: 'chief', sizePx: 12.5, weight: 550 },
  'label held': { colour: 'held', sizePx: 13, weight: 550 },
  'label bad': { colour: 'bad', sizePx: 13, weight: 600 },
  'label snap': { colour: 'chosen', sizePx: 12.5, weight: 550 },
  value: { colour: 'ink', sizePx: 15, weight: 550 },
  'value strong': { colour: 'ink', sizePx: 15, weight: 600 },
  'value held': { colour: 'held', sizePx: 15, weight: 550 },
  'value bad': { colour: 'bad', sizePx: 15, weight: 600 },
  'value quiet': { colour: 'quiet', sizePx: 15, weight: 400 },
};

/** The look of a line style. */
export function markLook(style: MarkStyle): MarkLook {
  return LOOKS.get(style) as MarkLook;
}

/** The look of a text style. */
export function textLook(style: TextStyle): TextLook {
  return TEXTS[style];
}

/** The CSS font of a text style, as canvas and measuring need it. */
export function fontOf(style: TextStyle): string {
  const { weight, sizePx } = TEXTS[style];
  return `${weight} ${sizePx}px ${FONT_FAMILY}`;
}

/** The ray style of off-axis bundle number `index` (0 innermost) out of `count`: one ramp from inner to outer. */
export function fieldBundle(index: number, count: number): RayName {
  const ramp = ['field inner bundle', 'field middle bundle', 'field outer bundle'] as const;
  const step = count <= 1 ? 2 : Math.round((index / (count - 1)) * 2);
  return ramp[Math.min(2, Math.max(0, step))] ?? 'field outer bundle';
}

const CURVE_INKS: Readonly<Record<CurveInk, ColourToken>> = {
  axial: 'axial',
  'field inner': 'field inner',
  'field middle': 'field middle',
  'field outer': 'field outer',
  ink: 'ink',
  quiet: 'quiet',
};

const CURVE_DASHES: Readonly<Record<CurveLine, readonly number[]>> = {
  main: [],
  short: [7, 3],
  long: [2, 3],
  fourth: [9, 3, 2, 3],
  fifth: [9, 2, 2, 2, 2, 2],
};

/** Every line style with its look, for a legend or a check of the whole table. */
export const LOOKS: ReadonlyMap<MarkStyle, MarkLook> = new Map<MarkStyle, MarkLook>([
  ...(Object.entries(MARKS) as [MarkStyle, MarkLook][]),
  ...(Object.entries(RAYS) as [RayName, MarkLook][]).flatMap(([name, look]): [MarkStyle, MarkLook][] => [
    [name, look],
    [`${name} virtual`, { ...look, width: 1.2, dash: DOTTED }],
    [`${name} paraxial`, { ...look, dash: DASHED }],
  ]),
  ...(Object.entries(CURVE_INKS) as [CurveInk, ColourToken][]).flatMap(
    ([ink, token]): [MarkStyle, MarkLook][] => [
      [`dots ${ink}`, line(token, 1)],
      ...(Object.entries(CURVE_DASHES) as [CurveLine, readonly number[]][]).map(
        ([name, dash]): [MarkStyle, MarkLook] => [`curve ${ink} ${name}`, line(token, 1.4, dash)],
      ),
    ],
  ),
]);

function line(stroke: ColourToken, width: number | 'hairline', dash: readonly number[] = []): MarkLook {
  return { stroke, fill: null, width, dash, crisp: false };
}

function crisp(stroke: ColourToken, width: number | 'hairline', dash: readonly number[] = []): MarkLook {
  return { stroke, fill: null, width, dash, crisp: true };
}

function outlined(stroke: ColourToken | null, fill: ColourToken | null, width: number): MarkLook {
  return { stroke, fill, width, dash: [], crisp: false };
}
