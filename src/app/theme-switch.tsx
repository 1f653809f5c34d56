import { IconButton } from '#src/components/icon-button.tsx';
import type { IconName } from '#src/components/icon.tsx';
import { Menu } from '#src/components/menu.tsx';
import { chooseTheme, themeChoices, useThemeChoice, type ThemeChoice } from './theme.ts';

const looks: Readonly<Record<ThemeChoice, { label: string; icon: IconName }>> = {
  system: { label: 'As the system', icon: 'system' },
  light: { label: 'Light paper', icon: 'light' },
  dark: { label: 'Dark paper', icon: 'dark' },
};

export function ThemeSwitch() {
  const chosen = useThemeChoice();
  return (
    <Menu
      align="end"
      trigger={<IconButton icon={looks[chosen].icon} label={`Theme: ${looks[chosen].label}`} />}
      items={themeChoices.map((choice) => ({
        label: looks[choice].label,
        icon: looks[choice].icon,
        checked: choice === chosen,
        onSelect: () => chooseTheme(choice),
      }))}
    />
  );
}
