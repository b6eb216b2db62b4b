import type { ConsentRequest } from '@holdwater/shared-types/lots/lot.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Field } from '../../../components/field';
import { Numeral } from '../../../components/numeral';
import { Panel } from '../../../components/panel';
import { Question } from '../../../components/question';
import { useErrorWords } from '../../../lib/errors';
import { Failed } from '../../../lib/query-state';
import { useTimeWords } from '../../../lib/time';
import { useAnswerConsents } from '../api/consents';

const ownZone = Intl.DateTimeFormat().resolvedOptions().timeZone;

/** The lots that ask one organization in; all are picked at first. */
export function ConsentGroup({ items }: { items: readonly ConsentRequest[] }): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const words = useTimeWords();
  const [left, setLeft] = useState<ReadonlySet<string>>(new Set());
  const [isRefusing, setIsRefusing] = useState(false);
  const [why, setWhy] = useState('');
  const answering = useAnswerConsents();
  const refusal = useErrorWords(answering.error);
  const organization = items[0]?.organization;
  const picked = items.filter(({ lotId }) => !left.has(lotId));
  const lotIds = picked.map(({ lotId }) => lotId);
  if (organization === undefined) return null;
  const builders = [...new Set(picked.map(({ builderName }) => builderName))].join(', ');
  const cannotYet = lotIds.length === 0 ? t('consents.nonePicked') : undefined;
  const answer = (isJoining: boolean): void =>
    answering.mutate(
      {
        organizationId: organization.id,
        lotIds,
        isJoining,
        ...(!isJoining && why.trim() !== '' ? { why: why.trim() } : {}),
      },
      {
        onSuccess: () => {
          setIsRefusing(false);
          sayDone({
            mark: 'sent',
            title: t(isJoining ? 'consents.joined' : 'consents.refused', { count: lotIds.length }),
          });
        },
      },
    );
  return (
    <Panel title={t('consents.asks', { organization: organization.name })} isFlush>
      <table className="ruled">
        <thead>
          <tr>
            <th scope="col">{t('table.lot')}</th>
            <th scope="col">{t('head.tract')}</th>
            <th scope="col">{t('title.address')}</th>
            <th scope="col">{t('parties.builder')}</th>
            <th scope="col">{t('consents.asked')}</th>
          </tr>
        </thead>
        <tbody>
          {items.map((item) => (
            <tr key={item.lotId}>
              <th scope="row">
                <label className="check-row">
                  <input
                    type="checkbox"
                    checked={!left.has(item.lotId)}
                    onChange={(event) => {
                      const next = new Set(left);
                      if (event.target.checked) next.delete(item.lotId);
                      else next.add(item.lotId);
                      setLeft(next);
                    }}
                  />
                  <span className="n">{item.lotNumber}</span>
                </label>
              </th>
              <td>{item.tractName ?? ''}</td>
              <td>{item.address}</td>
              <td>{item.builderName}</td>
              <td>
                <Numeral text={words.day(item.askedAt, ownZone)} />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      {refusal !== null && !isRefusing ? <Failed error={answering.error} level={3} /> : null}
      <div className="row wrap consent-acts">
        <Act kind="first" busy={answering.isPending} cannotYet={cannotYet} onClick={() => answer(true)}>
          {t('consents.join', { count: lotIds.length })}
        </Act>
        <Act kind="ending" cannotYet={cannotYet} onClick={() => setIsRefusing(true)}>
          {t('consents.refuse', { count: lotIds.length })}
        </Act>
      </div>
      <Question
        isOpen={isRefusing}
        title={t('consents.question', { count: lotIds.length })}
        keepWord={t('consents.keep')}
        endWord={t('consents.refuse', { count: lotIds.length })}
        onKeep={() => {
          answering.reset();
          setIsRefusing(false);
        }}
        onEnd={() => answer(false)}
        busy={answering.isPending}
        error={refusal ? `${refusal.title}. ${refusal.safe} ${refusal.next}` : undefined}
      >
        <p>{t('consents.told', { builders })}</p>
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
