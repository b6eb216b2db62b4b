import type { OrganizationBrief } from '@holdwater/shared-types/accounts/person.contract.js';
import type { HandoverKind, LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Question } from '../../../components/question';
import { useErrorWords } from '../../../lib/errors';
import { Failed } from '../../../lib/query-state';
import { useAskHandover, useWithdrawHandover } from '../api/handovers';
import { PartyField } from './party-field';

export interface ReplacePartyProps {
  lot: LotDetail;
  kind: HandoverKind;
  /** Who is on the lot now. */
  former: OrganizationBrief;
}

/** Who is asked to take the place of a party, or the act that asks somebody: after one question that says who is told. */
export function ReplaceParty({ lot, kind, former }: ReplacePartyProps): ReactNode {
  const { t } = useTranslation('lots');
  const [isOpen, setIsOpen] = useState(false);
  const asked = lot.handovers.find((one) => one.kind === kind);
  if (asked !== undefined) return <Asked lot={lot} kind={kind} organization={asked.organization} />;
  if (!lot.abilities.canAttach) return null;
  return (
    <>
      <Act kind="text" size="sm" onClick={() => setIsOpen(true)}>
        {t(`handover.replace.${kind}`)}
      </Act>
      {isOpen ? <WhoTakesOver lotId={lot.id} kind={kind} former={former} onDone={() => setIsOpen(false)} /> : null}
    </>
  );
}

/** Nobody asked has written anything yet, so it is taken back without a question. */
function Asked({
  lot,
  kind,
  organization,
}: Omit<ReplacePartyProps, 'former'> & { organization: OrganizationBrief }): ReactNode {
  const { t } = useTranslation('lots');
  const withdrawing = useWithdrawHandover(lot.id);
  return (
    <>
      <div className="spread s">
        <span>{organization.name}</span>
        <span className="t-brass">{t('handover.pending')}</span>
      </div>
      {lot.abilities.canAttach ? (
        <Act kind="text" size="sm" busy={withdrawing.isPending} onClick={() => withdrawing.mutate(kind)}>
          {t('handover.withdraw', { name: organization.name })}
        </Act>
      ) : null}
      {withdrawing.error !== null ? <Failed error={withdrawing.error} level={3} /> : null}
    </>
  );
}

interface WhoTakesOverProps extends Omit<ReplacePartyProps, 'lot'> {
  lotId: string;
  onDone: () => void;
}

function WhoTakesOver({ lotId, kind, former, onDone }: WhoTakesOverProps): ReactNode {
  const { t } = useTranslation('lots');
  const [chosen, setChosen] = useState<OrganizationBrief | null>(null);
  const [isMissing, setIsMissing] = useState(false);
  const asking = useAskHandover(lotId);
  const refusal = useErrorWords(asking.error);
  const ask = (): void => {
    setIsMissing(chosen === null);
    if (chosen === null) return;
    asking.mutate(
      { kind, organizationId: chosen.id },
      {
        onSuccess: () => {
          onDone();
          sayDone({ mark: 'sent', title: t('handover.asked', { name: chosen.name }) });
        },
      },
    );
  };
  const error = isMissing && chosen === null ? t('handover.chooseFirst') : undefined;
  return (
    <Question
      isOpen
      endKind="first"
      title={t(`handover.question.${kind}`, { former: former.name })}
      keepWord={t('handover.keep', { former: former.name })}
      endWord={chosen === null ? t('handover.askNobody') : t('handover.ask', { name: chosen.name })}
      onKeep={onDone}
      onEnd={ask}
      busy={asking.isPending}
      error={refusal ? `${refusal.title}. ${refusal.safe} ${refusal.next}` : error}
    >
      <p>{t(`handover.told.${kind}`, { former: former.name })}</p>
      <PartyField kind={kind} value={chosen} onChange={setChosen} />
    </Question>
  );
}
