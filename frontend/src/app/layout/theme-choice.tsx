import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../components/choice';
import { themeChoices, useThemeChoice } from '../../theme/theme-choice';

/** Light, dark, sun or as the device; kept on this device, never switched by itself. */
export function ThemeChoice(): ReactNode {
  const { t } = useTranslation('app');
  const { choice, chooseTheme } = useThemeChoice();
  const options = themeChoices.map((value) => ({ value, label: t(`themes.${value}`) }));
  return <Choice label={t('theme')} isLabelShown options={options} value={choice} onChange={chooseTheme} />;
}
