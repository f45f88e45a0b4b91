/** One line of the help sheet: what is done, by hand and by keys. */
export interface GestureHelp {
  readonly does: string;
  readonly hand: string;
  readonly keys: string;
}

export interface GestureGroup {
  readonly title: string;
  readonly gestures: readonly GestureHelp[];
}

/** What hands do on the drawing and the ribbon, with the way of each without dragging. */
export const GESTURES: readonly GestureGroup[] = [
  {
    title: 'On the drawing',
    gestures: [
      {
        does: 'Move a part; its two gaps change',
        hand: 'Drag its line',
        keys: '← →; Shift: what is behind moves along',
      },
      {
        does: 'Change a power',
        hand: 'Drag a focal point of the selected part',
        keys: 'Tab to the focal point, ← →',
      },
      {
        does: 'Change a radius or a thickness of glass',
        hand: 'Drag a ring on a surface of the selected glass, or a square above the axis',
        keys: 'Tab to it, ← →, or Enter and type',
      },
      {
        does: 'Bend glass at constant power; its principal planes stay',
        hand: 'Drag the ring below the axis',
        keys: 'Tab to the bending, ← →',
      },
      {
        does: 'Choose glass on the map',
        hand: 'Press a material in the card, point at the map; a click takes it',
        keys: 'Enter on the material, ← → ↑ ↓ or a name, Enter',
      },
      { does: 'Change a clear diameter', hand: 'Drag a rim', keys: 'Tab to the rim, ↑ ↓' },
      { does: 'Open or close the stop', hand: 'Drag its edges', keys: 'Tab to the edge, ↑ ↓' },
      {
        does: 'Set the field',
        hand: 'Drag the end of the chief ray, or the tip of the object',
        keys: '. to the object, Tab, ↑ ↓',
      },
      {
        does: 'Move the object or fix the sensor',
        hand: 'Drag its foot, or its line',
        keys: '. to it, ← →',
      },
      { does: 'Move a group', hand: 'Drag any part of it', keys: 'select all of it, ← →' },
      {
        does: 'Add a part',
        hand: 'Drag it from the tray, or tap the kind and then the axis',
        keys: 'P N S L G',
      },
      {
        does: 'Select several',
        hand: 'Shift and click',
        keys: 'Ctrl+A',
      },
      {
        does: 'Type the value under the hand, rename',
        hand: 'Double-click',
        keys: 'Enter, F2',
      },
      {
        does: 'Ask what an image, a pupil or a plane follows from',
        hand: 'Point at it and click',
        keys: 'More in the readouts',
      },
      { does: 'Take the next grip in the same place', hand: 'Press again', keys: 'Tab' },
    ],
  },
  {
    title: 'On the ribbon',
    gestures: [
      {
        does: 'Change a gap; what is behind moves along',
        hand: 'Click its value and type, or drag the value sideways',
        keys: 'Tab to the value, ← →, or Enter and type',
      },
      {
        does: 'Move a part; its two gaps change',
        hand: 'Drag its tick',
        keys: '. to the part, ← →',
      },
      {
        does: 'Give a gap its own value at every position',
        hand: 'Click “= all”',
        keys: '“= all” in the part’s card',
      },
    ],
  },
  {
    title: 'While dragging',
    gestures: [
      { does: 'Swap what takes up the change', hand: 'Shift', keys: 'Shift' },
      { does: 'Go finely: no snapping, a tenth of the motion', hand: 'Alt', keys: 'Alt' },
      { does: 'Ten times the step', hand: '', keys: 'Page Up, Page Down' },
      { does: 'Give it up', hand: 'Escape, or a second finger', keys: 'Escape, Ctrl+Z' },
    ],
  },
  {
    title: 'Looking around',
    gestures: [
      {
        does: 'Pan',
        hand: 'Drag the paper, Space or the middle button anywhere',
        keys: '← → with nothing selected',
      },
      { does: 'Zoom in length', hand: 'Wheel, or pinch', keys: '+ − with nothing selected' },
      {
        does: 'Stretch the heights',
        hand: 'Shift and wheel, or pinch upright',
        keys: '↑ ↓ with nothing selected',
      },
      {
        does: 'Look closer with the loupe',
        hand: 'Drag its ring anywhere, the dotted line in it through focus',
        keys: 'Tab to them, ← →; fields under Loupe in the panel',
      },
      {
        does: 'Read a plot; a stem of a sum lights up its surface',
        hand: 'Point at it; a press on a stem selects the part',
        keys: 'Tab to it, ← →, Home and End; Enter selects the part',
      },
      {
        does: 'Move between positions',
        hand: 'Drag the scrubber, or tap a stop of it',
        keys: '1 to 9, or ← → on the scrubber',
      },
    ],
  },
  {
    title: 'In a number field',
    gestures: [
      { does: 'Calculate', hand: '41-1.2   3*25   1/3in', keys: '+1 adds, −5 is a value' },
      { does: 'Take it, or leave it', hand: 'Leave the field', keys: 'Enter; Escape restores' },
      { does: 'Step', hand: '− and + beside it', keys: '↑ ↓; Page ten times, Alt a tenth' },
      { does: 'Swap what takes up the change', hand: 'Shift and − or +', keys: 'Shift and Enter, ↑ or ↓' },
      { does: 'Step back through the sketch', hand: '', keys: 'Ctrl+Z, when nothing is typed' },
    ],
  },
];
