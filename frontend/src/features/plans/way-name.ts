import type { Medium, Method } from '@holdwater/shared-types/holds/hold.states.js';
import { useTranslation } from 'react-i18next';

/** What a way is called: drains by their method, lines by what is in them. */
export function useWayName(): (way: { method: Method; medium: Medium }) => string {
  const { t } = useTranslation(['departments']);
  return ({ method, medium }) => {
    const name = method === 'gauge' ? t(`media.${medium}`) : t(`methods.${method}`);
    return name.charAt(0).toLocaleUpperCase() + name.slice(1);
  };
}
