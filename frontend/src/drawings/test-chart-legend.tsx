import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import type { TestChartData } from './test-chart.types';

/** Only what is drawn is explained. */
export function TestChartLegend({ data }: { data: TestChartData }): ReactNode {
  const { t } = useTranslation('marks');
  const { points, band, cone, settling, bandIs } = data;
  const shown: readonly (keyof typeof signs)[] = [
    points.some(({ isUsed }) => isUsed) ? ('reading' as const) : null,
    band.length > 1 ? bandIs : null,
    cone.length > 1 ? ('forecast' as const) : null,
    points.some(({ isOpen }) => !isOpen) ? ('shut' as const) : null,
    settling !== null || points.some(({ isOpen, isUsed }) => isOpen && !isUsed) ? ('notCounted' as const) : null,
  ].filter((one) => one !== null);
  return (
    <ul className="chart-legend s" aria-label={t('testChart.legend')}>
      {shown.map((one) => (
        <li key={one}>
          <svg width="22" height="12" viewBox="0 0 22 12" aria-hidden="true">
            {signs[one]}
          </svg>
          {t(`testChart.signs.${one}`)}
        </li>
      ))}
    </ul>
  );
}

const signs = {
  reading: <circle cx="11" cy="6" r="4.2" fill="var(--paper)" stroke="var(--water)" strokeWidth="2" />,
  trend: <rect y="2" width="22" height="8" fill="var(--waterFill)" />,
  temperature: <rect y="2" width="22" height="8" fill="var(--waterFill)" />,
  forecast: <path d="M0 6H22" stroke="var(--primer)" strokeWidth="2" strokeDasharray="6 4" />,
  shut: <rect x="7" y="2" width="8" height="8" fill="var(--paper)" stroke="var(--ink2)" strokeWidth="1.8" />,
  notCounted: <circle cx="11" cy="6" r="4.2" fill="var(--paper)" stroke="var(--ink2)" strokeWidth="1.6" />,
} as const;
