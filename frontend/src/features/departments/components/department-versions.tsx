import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { QueryState } from '../../../lib/query-state';
import { useTimeWords } from '../../../lib/time';
import { departmentQuery } from '../api/department';
import { VersionList } from './version-list';

/** A department and the versions of its rule card, for signed-in readers. */
export function DepartmentVersions(props: { departmentId: string; ruleCardId: string | null }): ReactNode {
  const { departmentId, ruleCardId } = props;
  const { t } = useTranslation('departments');
  const words = useTimeWords();
  const department = useQuery(departmentQuery(departmentId));
  return (
    <QueryState query={department}>
      {({ department: one, ruleCards }) => (
        <>
          <div className="list-head">
            <h2 className="h2">{one.name}</h2>
            <p className="s mid">
              {t('list.elevation', { feet: one.elevationFt.toLocaleString('en-US') })} {words.zone(one.zone)}
            </p>
            {one.phone === null ? null : (
              <a className="s n" href={`tel:${one.phone}`}>
                {one.phone}
              </a>
            )}
          </div>
          <VersionList ruleCards={ruleCards} chosenId={ruleCardId} />
        </>
      )}
    </QueryState>
  );
}
