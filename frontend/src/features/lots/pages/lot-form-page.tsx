import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useParams, useSearchParams } from 'react-router-dom';
import { useOrganization } from '../../../app/session';
import { Act } from '../../../components/act';
import { Choice } from '../../../components/choice';
import { Head, PhoneHead } from '../../../components/head';
import { Lines } from '../../../components/lines';
import { Plain } from '../../../components/plain';
import { useSheetWidth } from '../../../components/use-sheet-width';
import { Failed } from '../../../lib/query-state';
import { lotQuery } from '../api/lot';
import { EditLotForm } from '../components/edit-lot-form';
import { HouseForm } from '../components/house-form';
import { NewLotForm } from '../components/new-lot-form';
import '../lots.css';

/** A new lot, or the lot and its house changed. */
export function LotFormPage(): ReactNode {
  const { lotId } = useParams();
  return lotId === undefined ? <NewLot /> : <KnownLot lotId={lotId} />;
}

function FormHead({
  label,
  title,
  backTo,
  acts,
}: {
  label: string;
  title: string;
  backTo: string;
  acts?: ReactNode;
}): ReactNode {
  const { t } = useTranslation('common');
  const isPhone = useSheetWidth() === 'phone';
  if (isPhone) {
    return (
      <>
        <PhoneHead backTo={backTo} label={label} title={title} />
        {acts ? <div className="phone-choices">{acts}</div> : null}
      </>
    );
  }
  return (
    <Head
      label={label}
      title={title}
      acts={
        <>
          {acts}
          <Act to={backTo}>{t('back')}</Act>
        </>
      }
    />
  );
}

function NewLot(): ReactNode {
  const { t } = useTranslation('lots');
  const [search] = useSearchParams();
  const chosen = useOrganization();
  const head = <FormHead label={t('head.label')} title={t('form.newTitle')} backTo="/lots" />;
  if (chosen?.organization.kind !== 'builder') {
    return (
      <>
        {head}
        <Plain kind="none" title={t('form.onlyBuilders')} acts={<Act to="/lots">{t('form.toLots')}</Act>}>
          {t('form.onlyBuildersText')}
        </Plain>
      </>
    );
  }
  const { id } = chosen.organization;
  return (
    <>
      {head}
      <NewLotForm key={id} builderId={id} tractId={search.get('tract') ?? ''} />
    </>
  );
}

function KnownLot({ lotId }: { lotId: string }): ReactNode {
  const lot = useQuery(lotQuery(lotId));
  if (lot.data !== undefined) return <EditLot lot={lot.data} />;
  if (lot.isPending) return <Lines rows={8} />;
  return <Failed error={lot.error} level={1} onRetry={() => void lot.refetch()} />;
}

function EditLot({ lot }: { lot: LotDetail }): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const [search, setSearch] = useSearchParams();
  const { canEdit, canSetPermit, canAttach, canEditGeometry } = lot.abilities;
  const builderId = lot.parties.find(({ kind }) => kind === 'builder')?.organization.id ?? null;
  const hasLotPart = canEdit || canSetPermit || canAttach;
  const part = canEditGeometry && (search.get('part') === 'house' || !hasLotPart) ? 'house' : 'lot';
  const unit = lot.units.find(({ number }) => String(number) === search.get('unit')) ?? lot.units[0];
  const parts = (
    <>
      {hasLotPart && canEditGeometry ? (
        <Choice
          label={t('form.part')}
          options={(['lot', 'house'] as const).map((value) => ({ value, label: t(`form.parts.${value}`) }))}
          value={part}
          onChange={(value) => setSearch({ part: value })}
        />
      ) : null}
      {part === 'house' && lot.units.length > 1 ? (
        <Choice
          label={t('title.unit')}
          options={lot.units.map(({ number, label }) => ({ value: String(number), label }))}
          value={String(unit?.number ?? 1)}
          onChange={(value) => setSearch({ part: 'house', unit: value })}
        />
      ) : null}
    </>
  );
  const head = (
    <FormHead
      label={lot.tract?.name ?? lot.address}
      title={t('form.editTitle', { number: lot.number })}
      backTo={`/lots/${lot.id}`}
      acts={parts}
    />
  );
  if (!hasLotPart && !canEditGeometry) {
    return (
      <>
        {head}
        <Plain kind="none" title={t('form.notYours')}>
          {t('form.notYoursText')}
        </Plain>
      </>
    );
  }
  return (
    <>
      {head}
      {part === 'house' && unit !== undefined ? (
        <HouseForm key={unit.number} lotId={lot.id} unit={unit} builderId={canEdit ? builderId : null} />
      ) : (
        <EditLotForm key={lot.id} lot={lot} />
      )}
    </>
  );
}
