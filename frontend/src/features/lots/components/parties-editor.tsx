import type { OrganizationBrief } from '@holdwater/shared-types/accounts/person.contract.js';
import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Failed } from '../../../lib/query-state';
import { useAttachParty } from '../api/save-lot';
import { PartyField } from './party-field';
import { ReplaceParty } from './replace-party';

const kinds = ['plumber', 'department'] as const;

/** The plumber and the department of a lot that stands: who is on it, who was asked, and asking another. */
export function PartiesEditor({ lot }: { lot: LotDetail }): ReactNode {
  return (
    <div className="fields">
      {kinds.map((kind) => (
        <OneParty key={kind} lot={lot} kind={kind} />
      ))}
    </div>
  );
}

function OneParty({ lot, kind }: { lot: LotDetail; kind: (typeof kinds)[number] }): ReactNode {
  const { t } = useTranslation('lots');
  const [chosen, setChosen] = useState<OrganizationBrief | null>(null);
  const asking = useAttachParty(lot.id);
  const standing = lot.parties.filter((one) => one.kind === kind);
  const attached = standing.find(({ status }) => status === 'attached');
  const ask = (organization: OrganizationBrief): void =>
    asking.mutate(
      { kind, organizationId: organization.id },
      {
        onSuccess: () => {
          setChosen(null);
          sayDone({ mark: 'sent', title: t('parties.asked', { name: organization.name }) });
        },
      },
    );
  return (
    <div className="one-party">
      {standing.map((one) => (
        <p key={one.organization.id} className="spread">
          <span>
            <span className="lab">{t(`parties.${kind}`)}</span>
            <span className="b">{one.organization.name}</span>
          </span>
          <span className={one.status === 'attached' ? 't-green' : one.status === 'pending' ? 't-brass' : 't-red'}>
            {t(`parties.${one.status}`)}
          </span>
        </p>
      ))}
      {kind === 'plumber' && attached !== undefined ? (
        <ReplaceParty lot={lot} kind="plumber" former={attached.organization} />
      ) : null}
      {lot.abilities.canAttach && attached === undefined ? (
        <>
          <PartyField kind={kind} value={chosen} onChange={setChosen} />
          {chosen === null ? null : (
            <>
              <p className="s mid">{t('parties.askNote', { name: chosen.name })}</p>
              <Act busy={asking.isPending} onClick={() => ask(chosen)}>
                {t('parties.ask', { name: chosen.name })}
              </Act>
            </>
          )}
          {asking.error !== null ? <Failed error={asking.error} level={3} /> : null}
        </>
      ) : null}
    </div>
  );
}
