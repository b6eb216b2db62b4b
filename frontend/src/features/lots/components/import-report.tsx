import type { ImportFault, ImportReport } from '@holdwater/shared-types/lots/lot-import.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Mark } from '../../../components/mark';

/** What is wrong in a list of lots, line by line; or that nothing is. */
export function ImportFaults({ report }: { report: ImportReport }): ReactNode {
  const { t } = useTranslation('lots');
  const sorted = [...report.faults].sort((a, b) => a.line - b.line);
  if (sorted.length === 0) {
    return (
      <p className="row b t-green part-words" role="status">
        <Mark name="sent" size={24} />
        {t(report.isImported ? 'import.imported' : 'import.good', { count: report.lots })}
      </p>
    );
  }
  return (
    <>
      <p className="row b t-red part-words" role="alert">
        <Mark name="past-time" size={24} />
        {t('import.faults', { count: sorted.length })}
      </p>
      <table className="ruled" aria-label={t('import.report')}>
        <thead>
          <tr>
            <th scope="col">{t('import.line')}</th>
            <th scope="col">{t('import.column')}</th>
            <th scope="col">{t('import.wrong')}</th>
            <th scope="col">{t('import.typed')}</th>
          </tr>
        </thead>
        <tbody>
          {sorted.map((fault, index) => (
            <FaultRow key={index} fault={fault} />
          ))}
        </tbody>
      </table>
    </>
  );
}

function FaultRow({ fault }: { fault: ImportFault }): ReactNode {
  const { t } = useTranslation(['lots', 'errors']);
  const { line, column, code, value, suggestion } = fault;
  const words = t([`import.codes.${code}`, `errors.fields.${code}`, 'errors.fields.wrong']);
  return (
    <tr>
      <th scope="row">{line === 0 ? t('import.wholeFile') : <span className="n">{line}</span>}</th>
      <td className="n">{column ?? ''}</td>
      <td>
        {words}
        {suggestion === null ? null : (
          <span className="mid">
            {' '}
            {t(code === 'repeated-in-file' ? 'import.firstOn' : 'import.meant', { suggestion })}
          </span>
        )}
      </td>
      <td className="n">{value ?? ''}</td>
    </tr>
  );
}
