import type { RuleCardContent, TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import { withTest } from '@holdwater/shared-types/departments/rule-card-sources.js';
import { dwvMethods, waterMethods, type Method } from '@holdwater/shared-types/holds/hold.states.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { useRuleCardWords } from '../rule-card-words';
import { AirFields } from './air-fields';
import { CheckField, CheckList, PartFault } from './check-fields';
import { GaugeFields } from './gauge-fields';
import { HeadRuleFields } from './head-rule-fields';
import { ListFields } from './list-fields';
import { ModelCodeOffers } from './model-code-offers';
import { PressureFields } from './pressure-fields';
import { NumberField, OptionalNumberField, OwnWordsFields } from './text-fields';

export interface TestFieldsProps {
  content: RuleCardContent;
  index: number;
  onChange: (path: string, content: RuleCardContent) => void;
}

const seenFrom = ['sight-tube', 'overflow', 'photo-with-tape'] as const;

/** How one system is tested at a stage; what a model code offers stands under each value, where it does. */
export function TestFields({ content, index, onChange }: TestFieldsProps): ReactNode {
  const { t } = useTranslation('departments');
  const words = useRuleCardWords();
  const test = content.tests[index];
  if (test === undefined) return null;
  const isDwv = test.system === 'dwv';
  const at = (name: string): string => `tests.${index}.${name}`;
  const set = (change: Partial<TestRule>): void =>
    onChange(at(Object.keys(change)[0] ?? ''), withTest(content, index, change));
  const offers = { content, testIndex: index, onChange };
  const methods: readonly Method[] = isDwv ? dwvMethods : waterMethods;
  return (
    <fieldset className="item-fields test-fields">
      <legend className="h3">{words.t(`notes.${test.system}`)}</legend>
      <CheckList
        label={words.t('rows.accepted')}
        path={at('acceptedMethods')}
        options={methods.map((method) => ({ value: method, label: words.t(`methods.${method}`) }))}
        value={test.acceptedMethods}
        onChange={(acceptedMethods) => set({ acceptedMethods })}
      />
      {isDwv ? (
        <>
          <HeadRuleFields value={test.headRule} path={at('headRule')} onChange={(headRule) => set({ headRule })} />
          <ModelCodeOffers {...offers} field="headRule" />
        </>
      ) : null}
      <PressureFields value={test.pressures} path={at('pressures')} onChange={(pressures) => set({ pressures })} />
      <PartFault path={at('pressures')} />
      <ModelCodeOffers {...offers} field="pressures" />
      <Choice
        label={words.t('rows.measuredAt')}
        isLabelShown
        options={(['gauge', 'highest-outlet'] as const).map((each) => ({
          value: each,
          label: words.t(`says.measuredAt.${each}`),
        }))}
        value={test.measuredAt}
        onChange={(measuredAt) => set({ measuredAt })}
      />
      <div className="fields two">
        <OptionalNumberField
          label={words.t('rows.stand')}
          unit="min"
          hint={words.t('says.untilSeen')}
          path={at('standMinutes')}
          value={test.standMinutes}
          onChange={(standMinutes) => set({ standMinutes })}
        />
        <NumberField
          label={t('form.settle')}
          unit="min"
          path={at('settleMinutes')}
          value={test.settleMinutes}
          onChange={(settleMinutes) => set({ settleMinutes })}
        />
      </div>
      <ModelCodeOffers {...offers} field="standMinutes" />
      <AirFields test={test} path={at('airRules')} onChange={set} />
      <ModelCodeOffers {...offers} field="airOnPlastic" />
      <GaugeFields
        value={test.gaugeIncrements}
        path={at('gaugeIncrements')}
        onChange={(gaugeIncrements) => set({ gaugeIncrements })}
      />
      <ModelCodeOffers {...offers} field="gaugeIncrements" />
      <ListFields
        items={test.mayStayIsolated}
        fresh={() => ({ en: '' })}
        addWord={t('form.addIsolated')}
        nameOf={(at) => t('form.isolated', { number: at + 1 })}
        onChange={(mayStayIsolated) => set({ mayStayIsolated })}
      >
        {(own, place, change) => (
          <OwnWordsFields label={t('form.words')} path={at(`mayStayIsolated.${place}`)} value={own} onChange={change} />
        )}
      </ListFields>
      {isDwv ? (
        <CheckList
          label={words.t('rows.seenFrom')}
          path={at('levelSeenFrom')}
          options={seenFrom.map((each) => ({ value: each, label: words.t(`seenFrom.${each}`) }))}
          value={test.levelSeenFrom}
          onChange={(levelSeenFrom) => set({ levelSeenFrom })}
        />
      ) : null}
      <fieldset className="check-list">
        <legend className="lab">{t('form.photo')}</legend>
        <div className="row wrap">
          {(['reading', 'fix', 'takeDown'] as const).map((kind) => (
            <CheckField
              key={kind}
              label={words.t(`photo.${kind}`)}
              value={test.photoWanted[kind]}
              onChange={(isWanted) => set({ photoWanted: { ...test.photoWanted, [kind]: isWanted } })}
            />
          ))}
        </div>
      </fieldset>
    </fieldset>
  );
}
