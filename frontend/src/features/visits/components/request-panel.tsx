import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/choice';
import { Lines } from '../../../components/lines';
import { Numeral } from '../../../components/numeral';
import { Plain } from '../../../components/plain';
import { localName, useLocale } from '../../../lib/i18n';
import { Failed } from '../../../lib/query-state';
import { useOrganization } from '../../../lib/session-context';
import { useTimeWords } from '../../../lib/time';
import type { Offers } from '../api/offers';
import { useSendRequest } from '../use-send-request';
import type { Requesting } from '../use-requesting';
import { CutoffLine } from './cutoff-line';
import { LotChips } from './lot-chips';
import { LotSearch } from './lot-search';
import { OfferList } from './offer-list';
import { RefusedWindows } from './refused-windows';
import { RequestAct } from './request-act';
import { noWords, RequestMore } from './request-more';
import { SidePanel } from './side-panel';
import { TakenWindow } from './taken-window';

export interface RequestPanelProps {
  requesting: Requesting;
  onLots: (lotIds: readonly string[]) => void;
  onStage: (stageCode: string) => void;
  onClose: () => void;
}

/** Asks for a window: lots, stage, the cut-off, the windows on offer with their reasons, and one act that names what it books. */
export function RequestPanel({ requesting, onLots, onStage, onClose }: RequestPanelProps): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  const locale = useLocale();
  const words = useTimeWords();
  const { lots, stages, stage, query, chosen } = requesting;
  const offers = requesting.asked === null ? undefined : query.data;
  const hasCaller = useOrganization()?.organization.kind === 'department';
  const [values, setValues] = useState(noWords);
  const sending = useSendRequest({ requesting, values, hasCaller, onSent: onClose });
  const ids = lots.map(({ id }) => id);
  const first = lots[0]?.lot;
  const about = [first?.tract?.name, stage === null ? undefined : localName(stage.name, locale)];
  return (
    <SidePanel
      label={about.filter((part) => part !== undefined).join(', ') || t('req.label')}
      title={t('req.title')}
      onClose={onClose}
      foot={<RequestAct requesting={requesting} busy={sending.isPending} onSend={() => sending.send(chosen?.window)} />}
    >
      <div className="side-part">
        <LotChips
          lots={lots}
          onRemove={(lotId) => onLots(ids.filter((id) => id !== lotId))}
          onToggleUnit={requesting.toggleUnit}
        />
        <LotSearch chosen={ids} onAdd={(lotId) => onLots([...ids, lotId])} />
        {stages.length > 1 ? (
          <Choice
            label={t('req.stage')}
            isLabelShown
            stacked={stages.length > 3}
            options={stages.map(({ code, name }) => ({ value: code, label: localName(name, locale) }))}
            value={stage?.code ?? null}
            onChange={onStage}
          />
        ) : null}
        {offers === undefined ? null : (
          <p className="s mid">
            <Numeral
              text={t(`req.booking.${offers.booking}`, {
                department: offers.departmentName,
                count: offers.lotsPerRequest,
              })}
            />
          </p>
        )}
      </div>
      <TakenWindow
        error={sending.error}
        zone={offers?.zone ?? first?.zone ?? 'UTC'}
        actWord={t(offers?.booking === 'desk' ? 'taken.requestThis' : 'taken.bookThis')}
        busy={sending.isPending}
        onTake={sending.send}
      />
      <OffersPart requesting={requesting} offers={offers} />
      {offers === undefined ? null : (
        <div className="side-part">
          <RequestMore
            values={values}
            onChange={setValues}
            faultOf={sending.faultOf}
            hasCaller={hasCaller}
            zoneWords={words.zone(offers.zone)}
          />
        </div>
      )}
    </SidePanel>
  );
}

function OffersPart({ requesting, offers }: { requesting: Requesting; offers: Offers | undefined }): ReactNode {
  const { t } = useTranslation('visits');
  const { asked, query, chosen, choose } = requesting;
  if (asked === null) return null;
  if (offers === undefined) {
    return query.isPending ? <Lines /> : <Failed error={query.error} level={3} onRetry={() => void query.refetch()} />;
  }
  return (
    <>
      <CutoffLine offers={offers} readAtMs={query.dataUpdatedAt} onPassed={query.refetch} />
      {query.isError ? <Failed error={query.error} level={3} onRetry={() => void query.refetch()} /> : null}
      {requesting.offers.length === 0 ? (
        <Plain kind="empty" level={3} title={t('offer.noneTitle')}>
          {t('offer.noneText', { department: offers.departmentName, phone: offers.departmentPhone ?? '' })}
        </Plain>
      ) : (
        <OfferList
          offers={requesting.offers}
          chosen={chosen}
          zone={offers.zone}
          label={t('offer.list')}
          onChoose={choose}
        />
      )}
      <RefusedWindows windows={offers.windows} zone={offers.zone} />
    </>
  );
}
