import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { useState, type FormEvent, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Field } from '../../../components/field';
import { isApiError } from '../../../lib/api-error';
import { useFieldWords } from '../../../lib/errors';
import { Failed } from '../../../lib/query-state';
import { useAcceptCorrection } from '../api/accept-correction';
import { useFixCorrection } from '../api/fix-correction';
import { useReopenCorrection } from '../api/reopen-correction';

/** What the reader may do to a correction now: say it is fixed, accept it, or reopen it with the reason. */
export function CorrectionActs({ correction }: { correction: Correction }): ReactNode {
  const { t } = useTranslation('outcomes');
  const { abilities, number } = correction;
  const [asked, setAsked] = useState<'fix' | 'reopen' | null>(null);
  const accepting = useAcceptCorrection(() =>
    sayDone({ mark: 'correction-accepted', title: t('acts.accepted', { number }) }),
  );
  if (!abilities.canFix && !abilities.canDecide) return null;
  if (asked !== null) return <WordsForm correction={correction} which={asked} onLeave={() => setAsked(null)} />;
  return (
    <>
      <div className="row wrap">
        {abilities.canFix ? (
          <Act size="sm" onClick={() => setAsked('fix')} aria-label={t('acts.fixNamed', { number })}>
            {t('acts.fix')}
          </Act>
        ) : null}
        {abilities.canDecide ? (
          <>
            <Act
              size="sm"
              busy={accepting.isPending}
              aria-label={t('acts.acceptNamed', { number })}
              onClick={() => accepting.mutate({ correctionId: correction.id, expectedVersion: correction.version })}
            >
              {t('acts.accept')}
            </Act>
            <Act size="sm" onClick={() => setAsked('reopen')} aria-label={t('acts.reopenNamed', { number })}>
              {t('acts.reopen')}
            </Act>
          </>
        ) : null}
      </div>
      {accepting.error === null ? null : <Failed error={accepting.error} level={3} />}
    </>
  );
}

interface WordsFormProps {
  correction: Correction;
  which: 'fix' | 'reopen';
  onLeave: () => void;
}

function WordsForm({ correction, which, onLeave }: WordsFormProps): ReactNode {
  const { t } = useTranslation(['outcomes', 'common']);
  const fieldWords = useFieldWords();
  const [typed, setTyped] = useState('');
  const [isTried, setIsTried] = useState(false);
  const { id: correctionId, version: expectedVersion, number } = correction;
  const done = (): void => {
    sayDone({
      mark: which === 'fix' ? 'correction-fixed' : 'correction-open',
      title: t(`acts.${which}Done`, { number }),
    });
    onLeave();
  };
  const fixing = useFixCorrection(done);
  const reopening = useReopenCorrection(done);
  const words = typed.trim();
  const sending = which === 'fix' ? fixing : reopening;
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    setIsTried(true);
    if (words === '') return;
    if (which === 'fix') fixing.mutate({ correctionId, expectedVersion, note: words });
    else reopening.mutate({ correctionId, expectedVersion, why: words });
  };
  const served = isApiError(sending.error) ? (sending.error.fields['note'] ?? sending.error.fields['why']) : undefined;
  return (
    <form className="fields words-form" onSubmit={submit} noValidate>
      <Field
        label={t(`acts.${which}Label`)}
        error={isTried && words === '' ? fieldWords('required') : fieldWords(served)}
      >
        {(control) => (
          <textarea
            {...control}
            rows={2}
            autoFocus
            maxLength={which === 'fix' ? 1000 : 500}
            value={typed}
            onChange={(event) => setTyped(event.target.value)}
          />
        )}
      </Field>
      {sending.error === null || served !== undefined ? null : <Failed error={sending.error} level={3} />}
      <div className="row wrap">
        <Act size="sm" type="submit" kind={which === 'fix' ? 'first' : 'other'} busy={sending.isPending}>
          {t(`acts.${which}Send`)}
        </Act>
        <Act size="sm" kind="text" onClick={onLeave}>
          {t('common.cancel')}
        </Act>
      </div>
    </form>
  );
}
