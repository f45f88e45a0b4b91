import { box, type Pen, segment } from '../../../app/board/pen.ts';

/** A little of everything that a layer can draw. */
export function smallScene(pen: Pen): void {
  pen.group('rays', () => {
    pen.polylines([0, 10, 50, 20.04, 0, 30, 50, 20, 90, 25], [0, 2], 'axial bundle');
    pen.polyline(Float64Array.of(0, 40, 90, 41.96), 'chief ray virtual');
  });
  pen.group('parts', () => {
    segment(pen, 50.3, 5, 50.3, 60, 'part');
    pen.group('grips', () => {
      box(pen, 46, 1, 8, 8, 'grip');
      pen.circle(50, 30, 4.25, 'focal point');
    });
  });
  pen.clipped({ kind: 'disc', xPx: 90, yPx: 20, radiusPx: 15 }, () => {
    segment(pen, 80, 20, 100, 20, 'axis');
  });
  pen.text(50, 70, 'f −32 & "second" <group>', 'label strong', { align: 'centre', baseline: 'top' });
  pen.text(5, 70, 'turned', 'value', { turnRad: Math.PI / 2, halo: false });
}
