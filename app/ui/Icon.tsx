/** Line drawings on a 16 × 16 field; stroked with the text colour. */
const PATHS = {
  undo: 'M6 4 2.5 7.5 6 11M2.5 7.5H10a3.5 3.5 0 0 1 0 7',
  redo: 'm10 4 3.5 3.5L10 11M13.5 7.5H6a3.5 3.5 0 0 0 0 7',
  open: 'M1.5 13V3.5h4l1.5 2h5.5V7M1.5 13 4 7h11l-2.5 6z',
  save: 'M8 2v8m0 0L5 7m3 3 3-3M2.5 10.500v3h11v-3',
  copy: 'M5.5 5.500h8v8h-8zM10.5 5.500v-3h-8v8h3',
  theme: 'M8 2a6 6 0 1 0 0 12A6 6 0 0 0 8 2zM8 2v12M10 3v10M12 4.500v7',
  help: 'M5.5 6a2.5 2.5 0 1 1 3.6 2.200C8.3 8.6 8 9 8 10M8 12.700v.3',
  close: 'm4 4 8 8m0-8-8 8',
  plus: 'M8 3.500v9M3.5 8h9',
  minus: 'M3.5 8h9',
  fold: 'm6 4 4 4-4 4',
  up: 'm4 9.5 4-4 4 4',
  down: 'm4 6.5 4 4 4-4',
  left: 'm9.5 4-4 4 4 4',
  right: 'm6.5 4 4 4-4 4',
  remove: 'M3 4.500h10M6.5 4.500v-2h3v2M4.5 4.500l.5 9h6l.5-9M7 7v4M9 7v4',
  rename: 'm3 13 .7-3L10.5 3.200l2.3 2.300L6 12.300zM9 4.7 11.3 7',
  warning: 'M8 2.5 14.5 13.500h-13zM8 6.500v3.500M8 11.800v.2',
  working: 'M2.5 3.500h11M2.5 8h11M2.5 12.500h11M6 3.500v9',
  positive: 'M8 1.500v13M5.5 4 8 1.5 10.5 4M5.5 12 8 14.500l2.5-2.5',
  negative: 'M8 3.500v9M5.5 1 8 3.5 10.5 1M5.5 15 8 12.500l2.5 2.5',
  stop: 'M8 1.500v4M5.5 5.500h5M8 14.500v-4M5.5 10.500h5',
  plate: 'M5.5 2h5v12h-5z',
  flip: 'M8 2v12M5.5 5 2.5 8l3 3M10.5 5l3 3-3 3',
  fitParts: 'M2 5.500v5M14 5.500v5M5 3v10M11 3v10M2 8h12',
  fitAll: 'M2 4V2h2M12 2h2v2M14 12v2h-2M4 14H2v-2M4.5 8h7',
  more: 'M3.5 8h.010M8 8h.010M12.5 8h.01',
} as const;

export type IconName = keyof typeof PATHS;

interface IconProps {
  readonly name: IconName;
  /** Side in px. */
  readonly size?: number;
}

/** A small line icon. It says nothing to a screen reader: the button around it has the name. */
export function Icon({ name, size = 16 }: IconProps) {
  return (
    <svg className="icon" width={size} height={size} viewBox="0 0 16 16" aria-hidden="true" focusable="false">
      <path
        d={PATHS[name]}
        fill="none"
        stroke="currentColor"
        strokeWidth={name === 'more' ? 2.2 : 1.3}
        strokeLinecap="round"
        strokeLinejoin="round"
      />
    </svg>
  );
}
