import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Panel } from '../../../components/panel';
import { FinerFields, HeightFields, LaundryFields, WaterFields, type HouseFieldsProps } from './house-fields';
import { HouseFold } from './house-fold';
import { FloorRows, PipeRows, PlugRows, WaterPipeRows } from './house-rows';
import '../house-form.css';

/** Every field of a house: first what each needs, the finer parts folded. */
export function HouseParts({ form, refusals }: HouseFieldsProps & { refusals: number }): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const { plugs, pipes, waterPipes, measures } = form.values;
  return (
    <>
      <Panel title={t('house.floors')}>
        <p className="s mid part-note before">{t('house.datum', { context: measures.units })}</p>
        <FloorRows form={form} />
      </Panel>
      <Panel title={t('house.drains')}>
        <HeightFields form={form} />
      </Panel>
      <Panel title={t('house.laundry')}>
        <LaundryFields form={form} />
      </Panel>
      <Panel title={t('common.systems.water')}>
        <WaterFields form={form} />
      </Panel>
      <Panel title={t('house.finer')} isFlush>
        <HouseFold title={t('house.plugs')} count={plugs.length} refusals={refusals}>
          <PlugRows form={form} />
        </HouseFold>
        <HouseFold title={t('house.pipes')} count={pipes.length} refusals={refusals}>
          <p className="s mid part-note before">{t('house.pipesNote')}</p>
          <PipeRows form={form} />
        </HouseFold>
        <HouseFold title={t('house.waterPipes')} count={waterPipes.length} refusals={refusals}>
          <WaterPipeRows form={form} />
        </HouseFold>
        <HouseFold title={t('house.more')} refusals={refusals}>
          <FinerFields form={form} />
        </HouseFold>
      </Panel>
    </>
  );
}
