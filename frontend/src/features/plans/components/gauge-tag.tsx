import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { TestPlan } from '@holdwater/shared-types/plans/plan.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Icon } from '../../../components/icon';
import { Numeral } from '../../../components/numeral';
import { useTimeWords } from '../../../lib/time';
import { QrPicture } from './qr-picture';

export interface GaugeTagProps {
  lot: LotDetail;
  plan: TestPlan;
  /** When the test that stands was started; null leaves a line to write on. */
  standingSince: string | null;
  zone: string;
}

/** Hangs at the gauge: do not touch, whom to call, since when, what is in the lines. English and Spanish, black on white. */
export function GaugeTag({ lot, plan, standingSince, zone }: GaugeTagProps): ReactNode {
  const { t } = useTranslation(['plans', 'departments', 'lots']);
  const words = useTimeWords();
  const call = whomToCall(lot, plan);
  const materials = plan.system === 'water' ? plan.geometry.waterPipeMaterials : [plan.geometry.pipeMaterial ?? ''];
  const named = materials.filter((each) => each !== '').map((each) => t(`lots.materials.${each}`));
  const medium = t(`departments.media.${plan.medium}`);
  const visit = lot.nextVisit;
  return (
    <section className="gauge-tag" aria-label={t('tag.name')}>
      <div className="tag-head">
        <span className="tag-hole" aria-hidden="true" />
        <div>
          <p className="tag-pressure">{t('tag.pressure')}</p>
          <p className="b">{t('tag.pressureOther')}</p>
        </div>
      </div>
      <div className="tag-row">
        <p className="tag-do">{t('tag.do')}</p>
        <p>{t('tag.doOther')}</p>
      </div>
      <div className="tag-row row">
        <Icon name="phone" size={28} />
        <div>
          <p className="s">{call.name === '' ? t('tag.callPlain') : t('tag.call', { name: call.name })}</p>
          <p className="tag-phone n">{call.phone}</p>
        </div>
      </div>
      <dl className="tag-cells">
        <TagCell label={t('tag.since')}>{standingSince === null ? '' : words.dayClock(standingSince, zone)}</TagCell>
        <TagCell label={t('tag.inLines')}>
          {named.length === 0 ? medium : t('tag.inWhat', { medium, materials: named.join(', ') })}
        </TagCell>
        <TagCell label={t('tag.visit')}>
          {visit === null ? '' : words.dayWindow(visit.startAt, visit.endAt, visit.zone)}
        </TagCell>
        <TagCell label={t('tag.where')}>{lot.address}</TagCell>
      </dl>
      <div className="tag-row row">
        <QrPicture text={`${window.location.origin}/lots/${lot.id}`} name={t('tag.qr')} sizePx={104} />
        <div>
          <p className="b">{t('tag.scan')}</p>
          <p>{t('tag.scanOther')}</p>
        </div>
      </div>
    </section>
  );
}

function TagCell({ label, children }: { label: string; children: string }): ReactNode {
  return (
    <div>
      <dt className="xs">{label}</dt>
      <dd className="b">{children === '' ? <span className="tag-blank" /> : <Numeral text={children} />}</dd>
    </div>
  );
}

/** Whoever chose the plan, else the first of the plumber's people; the company's telephone where nobody has one. */
function whomToCall(lot: LotDetail, { chosenBy }: TestPlan): { name: string; phone: string } {
  const plumber = lot.parties.find(({ kind, status }) => kind === 'plumber' && status === 'attached');
  if (plumber === undefined) return { name: '', phone: '' };
  const person = plumber.people.find(({ name }) => name === chosenBy) ?? plumber.people[0];
  const phone = person?.phone ?? plumber.organization.phone ?? '';
  return { name: person?.name ?? plumber.organization.name, phone };
}
