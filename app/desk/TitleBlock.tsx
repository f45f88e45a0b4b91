import type { LengthUnit } from '../../engine/index.ts';

interface TitleBlockProps {
  readonly title: string;
  readonly date: Date;
  readonly scale: string;
  readonly unit: LengthUnit;
}

/** Left to be filled in, on the screen or by hand. */
const OPEN_FIELDS = ['Number', 'Revision', 'Owner', 'Drawn by', 'Approved by'] as const;

/** The data fields of a drawing's title block (ISO 7200): what the sketch knows, and room for the rest. */
export function TitleBlock({ title, date, scale, unit }: TitleBlockProps) {
  const known = [
    ['Title', title],
    ['Kind of document', 'layout drawing with spacing table'],
    ['Date of issue', isoDay(date)],
    ['Scale', scale],
    ['Lengths in', unit],
    ['Sheet', '1 of 1'],
  ] as const;
  return (
    <div className="title-block">
      {known.map(([name, value]) => (
        <p key={name} className="title-block-field">
          <span className="title-block-name">{name}</span>
          <span className={name === 'Title' ? 'title-block-title' : undefined}>{value}</span>
        </p>
      ))}
      {OPEN_FIELDS.map((name) => (
        <label key={name} className="title-block-field">
          <span className="title-block-name">{name}</span>
          <input type="text" className="field-input title-block-open" autoComplete="off" maxLength={60} />
        </label>
      ))}
    </div>
  );
}

/** The local day as ISO 8601. */
function isoDay(date: Date): string {
  const two = (value: number) => String(value).padStart(2, '0');
  return `${date.getFullYear()}-${two(date.getMonth() + 1)}-${two(date.getDate())}`;
}
