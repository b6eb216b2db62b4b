import type { ConsentRequest, TestToTakeOver } from '@holdwater/shared-types/lots/lot.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useMe } from '../../../app/session';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Field } from '../../../components/field';
import { Panel } from '../../../components/panel';
import { Question } from '../../../components/question';
import { useErrorWords } from '../../../lib/errors';
import { Failed } from '../../../lib/query-state';
import { useAnswerHandover } from '../api/handovers';
import { takenOver } from '../taken-over';
import { TestsToTakeOver } from './tests-to-take-over';

export interface HandoverRequestProps {
  item: ConsentRequest;
  replacesName: string;
  tests: readonly TestToTakeOver[];
}

/** A lot that asks an organization of the reader to take the place of another: taken over by itself, with the tests that stand on it. */
export function HandoverRequest({ item, replacesName, tests }: HandoverRequestProps): ReactNode {
  const { t } = useTranslation('lots');
  const { memberships } = useMe();
  const [typed, setTyped] = useState<Readonly<Record<string, string>>>({});
  const [isRefusing, setIsRefusing] = useState(false);
  const [why, setWhy] = useState('');
  const answering = useAnswerHandover(item.lotId);
  const refusal = useErrorWords(answering.error);
  const { organization, lotNumber: number } = item;
  const roles = memberships.find((one) => one.organization.id === organization.id)?.roles ?? [];
  const { takeOver, faults } = takenOver(tests, typed);
  const answer = (isJoining: boolean): void =>
    answering.mutate(
      {
        ...{ organizationId: organization.id, isJoining, takeOver: isJoining ? takeOver : [] },
        ...(!isJoining && why.trim() !== '' ? { why: why.trim() } : {}),
      },
      {
        onSuccess: () => {
          setIsRefusing(false);
          sayDone({ mark: 'sent', title: t(isJoining ? 'handover.taken' : 'handover.refused', { number }) });
        },
      },
    );
  return (
    <Panel title={t('handover.asks', { organization: organization.name, number, former: replacesName })}>
      <p className="s mid">
        {[item.tractName, item.address].filter(Boolean).join(', ')}. {t('handover.by', { builder: item.builderName })}
      </p>
      {tests.length === 0 ? null : (
        <TestsToTakeOver
          tests={tests}
          canRead={roles.includes('plumber')}
          typed={typed}
          faults={faults}
          onType={(holdId, value) => setTyped({ ...typed, [holdId]: value })}
        />
      )}
      {refusal !== null && !isRefusing ? <Failed error={answering.error} level={3} /> : null}
      <div className="row wrap consent-acts">
        <Act
          kind="first"
          busy={answering.isPending}
          cannotYet={Object.keys(faults).length > 0 ? t('handover.fixReadings') : undefined}
          onClick={() => answer(true)}
        >
          {t('handover.take', { number })}
        </Act>
        <Act kind="ending" onClick={() => setIsRefusing(true)}>
          {t('handover.refuse', { number })}
        </Act>
      </div>
      <Question
        isOpen={isRefusing}
        title={t('handover.refuseQuestion', { number })}
        keepWord={t('consents.keep')}
        endWord={t('handover.refuse', { number })}
        onKeep={() => {
          answering.reset();
          setIsRefusing(false);
        }}
        onEnd={() => answer(false)}
        busy={answering.isPending}
        error={refusal ? `${refusal.title}. ${refusal.safe} ${refusal.next}` : undefined}
      >
        <p>{t('consents.told', { builders: item.builderName })}</p>
        <Field
          label={t('consents.why')}
          isOptional
          maxLength={500}
          value={why}
          onChange={(event) => setWhy(event.target.value)}
        />
      </Question>
    </Panel>
  );
}
