import { ChoiceRow } from '../control/choice-row.tsx';

export type Theme = 'device' | 'light' | 'dark';

const options = [
  { value: 'device', label: 'As the device' },
  { value: 'light', label: 'Light' },
  { value: 'dark', label: 'Dark' },
];

/** Light or dark, by the device or forced. */
export function ThemeSwitch({
  theme,
  onChoose,
}: {
  theme: Theme;
  onChoose: (theme: Theme) => void;
}) {
  return (
    <ChoiceRow
      legend="Theme"
      name="theme"
      options={options}
      defaultValue={theme}
      onChoose={(value) => onChoose(value as Theme)}
    />
  );
}
