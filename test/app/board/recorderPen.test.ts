import { describe, expect, it } from 'vitest';
import { recorderPen } from '../../../app/board/recorderPen.ts';
import { smallScene } from './scene.ts';

describe('the recorder', () => {
  it('writes what was drawn, group by group, with rounded numbers', () => {
    const pen = recorderPen();
    smallScene(pen);
    expect(pen.toText()).toBe(
      [
        'rays',
        '  line [axial bundle] 0,10 50,20',
        '  line [axial bundle] 0,30 50,20 90,25',
        '  line [chief ray virtual] 0,40 90,42',
        'parts',
        '  line [part] 50.3,5 50.3,60',
        '  grips',
        '    closed [grip] 46,1 54,1 54,9 46,9',
        '    circle [focal point] 50,30 r 4.3',
        'inside disc',
        '  line [axis] 80,20 100,20',
        'text [label strong] 50,70 "f −32 & "second" <group>" centre top',
        'text [value] 5,70 "turned" turned',
      ].join('\n'),
    );
  });

  it('finds the marks of a group at any depth', () => {
    const pen = recorderPen();
    smallScene(pen);
    expect(pen.marksIn('grips').map((mark) => mark.kind)).toEqual(['closed', 'circle']);
    expect(pen.marksIn('rays')).toHaveLength(2);
    expect(pen.marksIn('nothing')).toEqual([]);
  });

  it('keeps as many decimals as it was told, and no negative zero', () => {
    const pen = recorderPen(3);
    pen.polyline([-0.0001, 1.23456, 2, 3], 'axis');
    expect(pen.marks).toEqual([{ kind: 'lines', style: 'axis', lines: [[0, 1.235, 2, 3]] }]);
  });
});
