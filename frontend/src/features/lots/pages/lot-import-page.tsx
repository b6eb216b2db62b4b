import type { OrganizationBrief } from '@holdwater/shared-types/accounts/person.contract.js';
import type { ImportReport } from '@holdwater/shared-types/lots/lot-import.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useSearchParams } from 'react-router-dom';
import { useOrganization } from '../../../app/session';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Head, PhoneHead } from '../../../components/head';
import { Panel } from '../../../components/panel';
import { Plain } from '../../../components/plain';
import { useSheetWidth } from '../../../components/use-sheet-width';
import { Failed } from '../../../lib/query-state';
import { useImportLots } from '../api/import-lots';
import { CsvField } from '../components/csv-field';
import { ImportFaults } from '../components/import-report';
import { PartyField } from '../components/party-field';
import { TractField } from '../components/tract-field';
import '../lots.css';
import '../lot-import.css';

/** Builder: adds many lots from a list; tried first, and all or none are added. */
export function LotImportPage(): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const chosen = useOrganization();
  const isPhone = useSheetWidth() === 'phone';
  const isBuilder = chosen?.organization.kind === 'builder';
  return (
    <>
      {isPhone ? (
        <PhoneHead backTo="/lots" label={t('head.label')} title={t('import.title')} />
      ) : (
        <Head label={t('head.label')} title={t('import.title')} acts={<Act to="/lots">{t('common.back')}</Act>} />
      )}
      {isBuilder ? (
        <ImportForm key={chosen.organization.id} builderId={chosen.organization.id} />
      ) : (
        <Plain kind="none" title={t('form.onlyBuilders')} acts={<Act to="/lots">{t('form.toLots')}</Act>}>
          {t('form.onlyBuildersText')}
        </Plain>
      )}
    </>
  );
}

interface Tried {
  /** What was tried; another list has to be tried again. */
  readonly about: string;
  readonly report: ImportReport;
}

function ImportForm({ builderId }: { builderId: string }): ReactNode {
  const { t } = useTranslation('lots');
  const [search] = useSearchParams();
  const [tractId, setTractId] = useState(search.get('tract') ?? '');
  const [plumber, setPlumber] = useState<OrganizationBrief | null>(null);
  const [department, setDepartment] = useState<OrganizationBrief | null>(null);
  const [csv, setCsv] = useState('');
  const [tried, setTried] = useState<Tried | null>(null);
  const importing = useImportLots();
  const list = {
    ...{ builderId, csv },
    tractId: tractId === '' ? null : tractId,
    plumberId: plumber?.id ?? null,
    departmentId: department?.id ?? null,
  };
  const about = JSON.stringify(list);
  const report = tried?.about === about ? tried.report : null;
  const isGood = report !== null && report.faults.length === 0 && !report.isImported;
  const send = (isTrial: boolean): void =>
    importing.mutate(
      { ...list, isTrial },
      {
        onSuccess: (answer) => {
          setTried({ about, report: answer });
          if (answer.isImported) sayDone({ mark: 'sent', title: t('import.imported', { count: answer.lots }) });
        },
      },
    );
  const isImported = report?.isImported === true;
  const to = tractId === '' ? '/lots?tract=all' : `/lots?tract=${tractId}`;
  return (
    <div className="two-columns">
      <div>
        <Panel title={t('import.list')}>
          <CsvField csv={csv} onChange={setCsv} />
          <div className="row wrap import-acts">
            <Act
              kind={isGood || isImported ? 'other' : 'first'}
              busy={importing.isPending}
              cannotYet={csv.trim() === '' ? t('import.noList') : undefined}
              onClick={() => send(true)}
            >
              {t('import.try')}
            </Act>
            {isGood ? (
              <Act kind="first" busy={importing.isPending} onClick={() => send(false)}>
                {t('import.add', { count: report.lots })}
              </Act>
            ) : null}
            {isImported ? (
              <Act kind="first" to={to}>
                {t('import.see')}
              </Act>
            ) : null}
          </div>
          <p className="s mid part-note">{t('import.allOrNone')}</p>
        </Panel>
        {importing.error !== null ? <Failed error={importing.error} /> : null}
        {report === null ? null : (
          <Panel title={t('import.report')} isFlush>
            <ImportFaults report={report} />
          </Panel>
        )}
      </div>
      <Panel title={t('import.forAll')}>
        <div className="fields">
          <TractField builderId={builderId} value={tractId} onChange={setTractId} />
          <PartyField kind="plumber" value={plumber} onChange={setPlumber} />
          <PartyField kind="department" value={department} onChange={setDepartment} />
          <p className="s mid">{t('parties.consent')}</p>
        </div>
      </Panel>
    </div>
  );
}
