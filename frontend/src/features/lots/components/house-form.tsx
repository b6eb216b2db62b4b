import { houseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import { useRef, type FormEvent, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Panel } from '../../../components/panel';
import { useSheetWidth } from '../../../components/use-sheet-width';
import { Cutaway } from '../../../drawings/cutaway';
import { Failed } from '../../../lib/query-state';
import { useContractForm } from '../../../lib/use-contract-form';
import { withoutPrefix } from '../../departments/without-prefix';
import { useSetGeometry } from '../api/save-lot';
import { focusFirstFault } from '../focus-fault';
import { draftOf, drawnDraft, geometryOf } from '../house-draft';
import { FloorRows, PipeRows, PlugRows } from './house-rows';
import { HeightFields, LaundryFields, WaterFields } from './house-fields';
import '../house-form.css';

/** The house as it will be tested, measured from the finished first floor; its section is drawn as it is typed. */
export function HouseForm({ lotId, unit }: { lotId: string; unit: LotDetail['units'][number] }): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const navigate = useNavigate();
  const place = useRef<HTMLFormElement>(null);
  const isPhone = useSheetWidth() === 'phone';
  const form = useContractForm(houseGeometry, draftOf(unit.geometry, 'first'));
  const saving = useSetGeometry(lotId, unit.number);
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const geometry = geometryOf(form.values);
    if (!form.check(geometry)) return focusFirstFault(place.current);
    saving.mutate(geometry, {
      onError: (error) => {
        form.takeError(withoutPrefix(error, 'geometry.'));
        focusFirstFault(place.current);
      },
      onSuccess: () => {
        sayDone({ mark: 'sent', title: t('house.saved') });
        void navigate(`/lots/${lotId}`);
      },
    });
  };
  const drawing = (
    <div className="house-drawing">
      <Cutaway house={drawnDraft(form.values)} method={null} fillLevelFt={null} maxHeight={isPhone ? 240 : 420} />
      <p className="s mid">{t('house.drawn')}</p>
    </div>
  );
  return (
    <div className="house-split">
      <form ref={place} onSubmit={submit} noValidate className="lot-form">
        {isPhone ? drawing : null}
        <Panel title={t('house.floors')}>
          <p className="s mid part-note before">{t('house.datum')}</p>
          <FloorRows form={form} />
        </Panel>
        <Panel title={t('house.drains')}>
          <HeightFields form={form} />
        </Panel>
        <Panel title={t('house.plugs')}>
          <PlugRows form={form} />
        </Panel>
        <Panel title={t('house.laundry')}>
          <LaundryFields form={form} />
        </Panel>
        <Panel title={t('house.pipes')}>
          <p className="s mid part-note before">{t('house.pipesNote')}</p>
          <PipeRows form={form} />
        </Panel>
        <Panel title={t('common.systems.water')}>
          <WaterFields form={form} />
        </Panel>
        <div className="form-foot">
          {saving.error !== null ? <Failed error={saving.error} /> : null}
          <Act kind="first" size="lg" type="submit" busy={saving.isPending}>
            {t('house.save')}
          </Act>
          <p className="s mid">{t('common.localCode')}</p>
        </div>
      </form>
      {isPhone ? null : <aside aria-label={t('section.title')}>{drawing}</aside>}
    </div>
  );
}
