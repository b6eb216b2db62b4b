import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import { useRef, type FormEvent, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Head } from '../../../components/head';
import { Failed } from '../../../lib/query-state';
import { useEditRuleCard } from '../api/edit-rule-card';
import { AskingSection } from '../draft/asking-section';
import { CorrectionsSection } from '../draft/corrections-section';
import { DraftFaultsContext } from '../draft/draft-context';
import { FeesSection } from '../draft/fees-section';
import { ReadinessSection } from '../draft/readiness-section';
import { StageSection } from '../draft/stage-section';
import { withNewStage } from '../draft/stages-of-draft';
import { useRuleCardDraft } from '../draft/use-rule-card-draft';

/** Desk: every field of a draft, folded by note and stage; saved half done as well, and marked where it could not be published. */
export function DraftForm({ ruleCard }: { ruleCard: RuleCard }): ReactNode {
  const { t } = useTranslation(['departments', 'common']);
  const draft = useRuleCardDraft(ruleCard);
  const editing = useEditRuleCard(ruleCard.id);
  const place = useRef<HTMLFormElement>(null);
  const { content, edit } = draft;
  const focusFault = (): void =>
    void requestAnimationFrame(() =>
      place.current?.querySelector<HTMLElement>('[aria-invalid="true"], [data-fault]')?.focus(),
    );
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    if (!draft.check()) return focusFault();
    editing.mutate(content, {
      onError: (error) => {
        draft.takeError(error);
        focusFault();
      },
      onSuccess: () => {
        draft.lookAtWhole();
        sayDone({ mark: 'sent', title: t('draft.saved', { version: ruleCard.version }) });
      },
    });
  };
  return (
    <DraftFaultsContext value={draft.faults}>
      <Head
        label={t('draft.title', { version: ruleCard.version })}
        title={t('sheet.title', { department: ruleCard.departmentName, version: ruleCard.version })}
      />
      <form ref={place} onSubmit={submit} noValidate className="draft-form">
        <p className="s mid panel-body">{t('form.caution')}</p>
        <AskingSection value={content.asking} onChange={(path, asking) => edit(path, { ...content, asking })} />
        <ReadinessSection
          value={content.readiness}
          lateness={content.lateness}
          onChange={(readiness) => edit('readiness', { ...content, readiness })}
          onLateness={(lateness) => edit('lateness', { ...content, lateness })}
        />
        {content.stages.map((_stage, index) => (
          <StageSection key={index} content={content} index={index} onChange={edit} />
        ))}
        <div className="panel-body">
          <Act size="sm" icon="plus" onClick={() => edit('stages', withNewStage(content))}>
            {t('form.addStage')}
          </Act>
        </div>
        <FeesSection
          fees={content.fees}
          weather={content.weather}
          onFees={(fees) => edit('fees', { ...content, fees })}
          onWeather={(weather) => edit('weather', { ...content, weather })}
        />
        <CorrectionsSection
          value={content.corrections}
          onChange={(path, corrections) => edit(path, { ...content, corrections })}
        />
        <div className="panel-body draft-foot">
          {editing.error !== null ? <Failed error={editing.error} level={3} /> : null}
          {draft.faultCount > 0 ? <p className="t-red">{t('form.notYet', { count: draft.faultCount })}</p> : null}
          <Act type="submit" kind="first" busy={editing.isPending}>
            {t('draft.save', { version: ruleCard.version })}
          </Act>
        </div>
      </form>
    </DraftFaultsContext>
  );
}
