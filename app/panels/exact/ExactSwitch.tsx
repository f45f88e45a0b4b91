import { useReadingNow } from '../../live/reading.ts';
import { setView, viewStore } from '../../store/viewStore.ts';
import { Checkbox } from '../../ui/choices.tsx';

interface ExactSwitchProps {
  readonly what: 'paraxial' | 'exact' | 'whiskers';
  readonly label: string;
}

/** Whether a kind of ray, or the whiskers, are drawn. */
export function ExactSwitch({ what, label }: ExactSwitchProps) {
  const checked = useReadingNow(({ view }) => view.exact[what]);
  return (
    <Checkbox
      label={label}
      checked={checked}
      onChange={(on) => setView({ exact: { ...viewStore.getState().exact, [what]: on } })}
    />
  );
}
