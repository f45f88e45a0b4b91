import { digitsIn, mmPer } from '../../../engine/index.ts';
import { useReadingNow } from '../../live/reading.ts';
import { NumberField } from '../../ui/NumberField.tsx';

interface ViewNumberProps {
  readonly label: string;
  readonly digits: number;
  readonly step: number;
  /** The least and the greatest value that are taken. */
  readonly least?: number;
  readonly most?: number;
}

interface LengthFieldProps extends ViewNumberProps {
  /** Null where it follows something; `follows` says what. */
  readonly valueMm: number | null;
  readonly follows?: string;
  readonly onSet: (valueMm: number) => void;
  readonly onFollow?: () => void;
}

/** A length of the view, in the unit chosen for the screen; its digits, step and limits are in mm. */
export function LengthField({ valueMm, digits, step, ...props }: LengthFieldProps) {
  const unit = useReadingNow(({ view }) => view.unit);
  return (
    <BoundedNumber
      {...props}
      value={valueMm}
      unit={unit}
      digits={digitsIn(unit, digits)}
      step={step / mmPer(unit)}
    />
  );
}

interface TimesFieldProps extends ViewNumberProps {
  readonly value: number | null;
  readonly follows?: string;
  readonly onSet: (value: number) => void;
  readonly onFollow?: () => void;
}

/** How many times something is drawn. */
export const TimesField = (props: TimesFieldProps) => <BoundedNumber {...props} unit="" />;

interface BoundedNumberProps extends TimesFieldProps {
  readonly unit: '' | 'mm' | 'in';
}

function BoundedNumber(props: BoundedNumberProps) {
  const { label, value, unit, digits, step, follows, onSet, onFollow } = props;
  const { least = Number.NEGATIVE_INFINITY, most = Number.POSITIVE_INFINITY } = props;
  const set = (next: number): string | null => {
    if (!(next >= least && next <= most)) return rangeWords(label, least, most);
    onSet(next);
    return null;
  };
  return (
    <NumberField
      label={label}
      value={value}
      unit={unit}
      digits={digits}
      step={step}
      {...(follows !== undefined && { whenEmpty: follows })}
      onCommit={(next) => {
        if (next !== null) return set(next);
        onFollow?.();
        return null;
      }}
      onPreview={set}
    />
  );
}

const rangeWords = (label: string, least: number, most: number): string =>
  Number.isFinite(most) ? `${label} may be from ${least} to ${most}.` : `${label} must be ${least} or more.`;
