import type { ClipShape, Flat, Pen, TextPlace } from './pen.ts';
import { type ColourToken, fontOf, type MarkStyle, markLook, type Palette, textLook } from './styles.ts';
import { isNear, tracePath } from './trim.ts';

/** Width (px) of the rim of sheet colour around texts. */
const HALO_PX = 4;

/** The part of a 2D context that the pen uses, so that a test can stand in for it. */
export type Paintable = Pick<
  CanvasRenderingContext2D,
  | 'save'
  | 'restore'
  | 'beginPath'
  | 'moveTo'
  | 'lineTo'
  | 'closePath'
  | 'arc'
  | 'rect'
  | 'clip'
  | 'stroke'
  | 'fill'
  | 'fillText'
  | 'strokeText'
  | 'translate'
  | 'rotate'
  | 'setLineDash'
  | 'strokeStyle'
  | 'fillStyle'
  | 'lineWidth'
  | 'lineJoin'
  | 'font'
  | 'textAlign'
  | 'textBaseline'
>;

/**
 * A pen that paints on a 2D context already scaled to CSS px (see `surface.ts`). Hairlines are one device pixel;
 * every call of `polylines` is one path.
 */
export function canvasPen(ctx: Paintable, palette: Palette, devicePixelRatio: number): Pen {
  const paint = (style: MarkStyle): void => {
    const look = markLook(style);
    if (look.fill !== null) {
      ctx.fillStyle = palette[look.fill];
      ctx.fill();
    }
    if (look.stroke === null) return;
    ctx.strokeStyle = palette[look.stroke];
    ctx.lineWidth = widthOf(style, devicePixelRatio);
    ctx.lineJoin = 'round';
    ctx.setLineDash(look.dash as number[]);
    ctx.stroke();
  };

  const pen: Pen = {
    polyline(points, style) {
      ctx.beginPath();
      if (points.length === 4 && markLook(style).crisp)
        tracePath(ctx, aligned(points, style, devicePixelRatio), 0, 2);
      else tracePath(ctx, points, 0, points.length / 2);
      paint(style);
    },
    polylines(points, starts, style) {
      ctx.beginPath();
      for (let i = 0; i < starts.length; i++)
        tracePath(ctx, points, starts[i] as number, starts[i + 1] ?? points.length / 2);
      paint(style);
    },
    closed(points, style) {
      if (!isNear(points)) return;
      ctx.beginPath();
      tracePath(ctx, points, 0, points.length / 2);
      ctx.closePath();
      paint(style);
    },
    circle(xPx, yPx, radiusPx, style) {
      if (!isNear([xPx, yPx])) return;
      ctx.beginPath();
      ctx.arc(xPx, yPx, radiusPx, 0, 2 * Math.PI);
      paint(style);
    },
    text(xPx, yPx, text, style, place = {}) {
      if (!isNear([xPx, yPx])) return;
      const colour = (token: ColourToken): string => palette[token];
      ctx.font = fontOf(style);
      ctx.textAlign = place.align === 'centre' ? 'center' : (place.align ?? 'left');
      ctx.textBaseline = place.baseline ?? 'alphabetic';
      turned(ctx, xPx, yPx, place, (x, y) => {
        if (place.halo !== false) {
          ctx.strokeStyle = colour('paper');
          ctx.lineWidth = HALO_PX;
          ctx.lineJoin = 'round';
          ctx.setLineDash([]);
          ctx.strokeText(text, x, y);
        }
        ctx.fillStyle = colour(textLook(style).colour);
        ctx.fillText(text, x, y);
      });
    },
    group(_name, draw) {
      draw();
    },
    clipped(shape, draw) {
      ctx.save();
      ctx.beginPath();
      outline(ctx, shape);
      ctx.clip();
      draw();
      ctx.restore();
    },
  };
  return pen;
}

/** The width (px) a line style is painted with. */
export function widthOf(style: MarkStyle, devicePixelRatio: number): number {
  const { width } = markLook(style);
  return width === 'hairline' ? 1 / devicePixelRatio : width;
}

/**
 * The two ends of an upright or level line moved, by less than a device pixel, to where its edges fall on device
 * pixels; another line is left as it is.
 */
export function aligned(points: Flat, style: MarkStyle, devicePixelRatio: number): Flat {
  const [x1, y1, x2, y2] = points as unknown as [number, number, number, number];
  const deviceWidth = Math.max(1, Math.round(widthOf(style, devicePixelRatio) * devicePixelRatio));
  const half = (deviceWidth % 2) / 2;
  const snap = (px: number): number => (Math.round(px * devicePixelRatio - half) + half) / devicePixelRatio;
  if (x1 === x2) return [snap(x1), y1, snap(x2), y2];
  if (y1 === y2) return [x1, snap(y1), x2, snap(y2)];
  return points;
}

function turned(
  ctx: Paintable,
  xPx: number,
  yPx: number,
  place: TextPlace,
  draw: (x: number, y: number) => void,
): void {
  if (!place.turnRad) {
    draw(xPx, yPx);
    return;
  }
  ctx.save();
  ctx.translate(xPx, yPx);
  ctx.rotate(place.turnRad);
  draw(0, 0);
  ctx.restore();
}

function outline(ctx: Paintable, shape: ClipShape): void {
  if (shape.kind === 'disc') ctx.arc(shape.xPx, shape.yPx, shape.radiusPx, 0, 2 * Math.PI);
  else ctx.rect(shape.xPx, shape.yPx, shape.widthPx, shape.heightPx);
}
