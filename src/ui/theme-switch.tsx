// System, light or dark.
import { Segment } from './form/segment';
import { chooseTheme, useThemeChoice, type ThemeChoice } from './theme';

const CHOICES: readonly { readonly value: ThemeChoice; readonly label: string }[] = [
  { value: 'system', label: 'System' },
  { value: 'light', label: 'Light' },
  { value: 'dark', label: 'Dark' },
];

export function ThemeSwitch() {
  const choice = useThemeChoice();
  return <Segment legend="Colours" options={CHOICES} value={choice} onChange={chooseTheme} tight />;
}
