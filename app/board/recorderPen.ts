import type { ClipShape, Flat, Pen, TextPlace } from './pen.ts';
import type { MarkStyle, TextStyle } from './styles.ts';

/** One call of a pen as plain data, coordinates rounded. */
export type Mark =
  | { readonly kind: 'lines'; readonly style: MarkStyle; readonly lines: readonly (readonly number[])[] }
  | { readonly kind: 'closed'; readonly style: MarkStyle; readonly points: readonly number[] }
  | {
      readonly kind: 'circle';
      readonly style: MarkStyle;
      readonly xPx: number;
      readonly yPx: number;
      readonly radiusPx: number;
    }
  | {
      readonly kind: 'text';
      readonly style: TextStyle;
      readonly xPx: number;
      readonly yPx: number;
      readonly text: string;
      readonly place: TextPlace;
    }
  | { readonly kind: 'group'; readonly name: string; readonly marks: readonly Mark[] }
  | { readonly kind: 'clipped'; readonly shape: ClipShape; readonly marks: readonly Mark[] };

export interface RecorderPen extends Pen {
  readonly marks: readonly Mark[];
  /** The marks inside every group of that name, at any depth. */
  marksIn(group: string): readonly Mark[];
  /** One line of text a mark, groups indented: for tests of structure. */
  toText(): string;
}

/** A pen that keeps what was drawn as data, with coordinates rounded to `decimals`. */
export function recorderPen(decimals = 1): RecorderPen {
  const round = (value: number): number => Number(value.toFixed(decimals)) + 0;
  const all: Mark[] = [];
  let into = all;
  const inside = (open: (marks: Mark[]) => Mark, draw: () => void): void => {
    const marks: Mark[] = [];
    const outer = into;
    outer.push(open(marks));
    into = marks;
    draw();
    into = outer;
  };
  return {
    marks: all,
    polyline(points, style) {
      into.push({ kind: 'lines', style, lines: [rounded(points, 0, points.length / 2, round)] });
    },
    polylines(points, starts, style) {
      const lines = Array.from(starts, (start, i) =>
        rounded(points, start, starts[i + 1] ?? points.length / 2, round),
      );
      into.push({ kind: 'lines', style, lines });
    },
    closed(points, style) {
      into.push({ kind: 'closed', style, points: rounded(points, 0, points.length / 2, round) });
    },
    circle(xPx, yPx, radiusPx, style) {
      into.push({ kind: 'circle', style, xPx: round(xPx), yPx: round(yPx), radiusPx: round(radiusPx) });
    },
    text(xPx, yPx, text, style, place = {}) {
      into.push({ kind: 'text', style, xPx: round(xPx), yPx: round(yPx), text, place });
    },
    group(name, draw) {
      inside((marks) => ({ kind: 'group', name, marks }), draw);
    },
    clipped(shape, draw) {
      inside((marks) => ({ kind: 'clipped', shape, marks }), draw);
    },
    marksIn: (group) => found(all, group),
    toText: () => written(all, '').join('\n'),
  };
}

function rounded(
  points: Flat,
  from: number,
  to: number,
  round: (value: number) => number,
): readonly number[] {
  return Array.from({ length: 2 * (to - from) }, (_, i) => round(points[2 * from + i] as number));
}

function found(marks: readonly Mark[], group: string): readonly Mark[] {
  return marks.flatMap((mark) => {
    if (mark.kind !== 'group' && mark.kind !== 'clipped') return [];
    return mark.kind === 'group' && mark.name === group ? mark.marks : found(mark.marks, group);
  });
}

function written(marks: readonly Mark[], indent: string): readonly string[] {
  return marks.flatMap((mark) => linesOf(mark, indent));
}

function linesOf(mark: Mark, indent: string): readonly string[] {
  switch (mark.kind) {
    case 'lines':
      return mark.lines.map((line) => `${indent}line [${mark.style}] ${pairs(line)}`);
    case 'closed':
      return [`${indent}closed [${mark.style}] ${pairs(mark.points)}`];
    case 'circle':
      return [`${indent}circle [${mark.style}] ${mark.xPx},${mark.yPx} r ${mark.radiusPx}`];
    case 'text':
      return [`${indent}text [${mark.style}] ${mark.xPx},${mark.yPx} "${mark.text}"${placeText(mark.place)}`];
    case 'group':
      return [`${indent}${mark.name}`, ...written(mark.marks, `${indent}  `)];
    case 'clipped':
      return [`${indent}inside ${mark.shape.kind}`, ...written(mark.marks, `${indent}  `)];
  }
}

function pairs(points: readonly number[]): string {
  const list: string[] = [];
  for (let i = 0; i + 1 < points.length; i += 2) list.push(`${points[i]},${points[i + 1]}`);
  return list.join(' ');
}

function placeText({ align, baseline, turnRad }: TextPlace): string {
  return [align, baseline, turnRad ? 'turned' : undefined]
    .filter(Boolean)
    .map((word) => ` ${word}`)
    .join('');
}
