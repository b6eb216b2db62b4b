import type { LedgerEntry } from '@holdwater/shared-types/ledger/ledger.contract.js';
import type { TFunction } from 'i18next';
import { useCallback } from 'react';
import { useTranslation } from 'react-i18next';
import { useTimeWords, type TimeWords } from '../../lib/time';
import { listOf, numberOf, textOf, textsOf } from './ledger-payload';

type Words = TFunction<['threads', 'marks', 'common', 'holds']>;

/** What the words of an entry are made with. */
interface Told {
  readonly t: Words;
  readonly time: TimeWords;
  readonly zone: string;
}

type Payload = LedgerEntry['payload'];

/** Codes that stand in payloads where a person may also have written words of their own. */
const knownReasons = [
  'weather',
  'not-ready-in-time',
  'plans-changed',
  'asked-by-mistake',
  'other',
  'not-up',
  'taken-down',
  'lost',
  'superseded',
  'handed-over',
  'down-overnight',
  'wrong-method',
  'covered-early',
  'locked',
  'site-closed',
  'hazard',
  'permit-not-on-site',
  'not-seen',
];

/**
 * The words of an entry of the ledger in the reader's language, its instants on the wall clock of `zone`. An entry of a kind this page does
 * not know yet is told by its code.
 */
export function useLedgerWords(): (entry: LedgerEntry, zone: string) => string {
  const { t, i18n } = useTranslation(['threads', 'marks', 'common', 'holds']);
  const time = useTimeWords();
  return useCallback(
    (entry, zone) => {
      const key = `threads.ledger.${entry.kind}`;
      if (!i18n.exists(key)) return t('ledgerUnknown', { kind: entry.kind });
      const { variant, params } = valuesOf(entry, { t, time, zone });
      return t(variant === undefined ? `ledger.${entry.kind}` : `ledger.${entry.kind}-${variant}`, params);
    },
    [t, i18n, time],
  );
}

interface Values {
  /** A second sentence of the same kind: `reading-added-shut`. */
  readonly variant?: string;
  readonly params: Record<string, string | number>;
}

function valuesOf({ kind, payload }: LedgerEntry, told: Told): Values {
  const special = specials[kind];
  if (special !== undefined) return special(payload, told);
  const { t } = told;
  return {
    params: {
      ...plainValues(payload),
      reason: reasonWords(t, textOf(payload, 'reason') ?? textOf(payload, 'why') ?? ''),
      window: windowWords(payload, told),
      party: partyWords(t, payload),
    },
  };
}

/** Texts and numbers as they stand. */
function plainValues(payload: Payload): Record<string, string | number> {
  const plain = Object.entries(payload).filter(
    (pair): pair is [string, string | number] => typeof pair[1] === 'string' || typeof pair[1] === 'number',
  );
  return Object.fromEntries(plain);
}

export function reasonWords(t: TFunction<['threads', 'marks', 'common', 'holds']>, reason: string): string {
  return knownReasons.includes(reason) ? t(`reasons.${reason}`) : reason;
}

function windowWords(payload: Payload, { time, zone }: Told): string {
  const [startAt, endAt] = [textOf(payload, 'startAt'), textOf(payload, 'endAt')];
  return startAt === null || endAt === null ? '' : time.dayWindow(startAt, endAt, zone);
}

function partyWords(t: Words, payload: Payload): string {
  const kind = textOf(payload, 'kind');
  return kind === 'builder' || kind === 'plumber' || kind === 'department' ? t(`common.kinds.${kind}`) : '';
}

function systemWords(t: Words, system: string | null): string {
  return system === 'dwv' || system === 'water' ? t(`common.systems.${system}`) : (system ?? '');
}

const specials: Readonly<Record<string, (payload: Payload, told: Told) => Values>> = {
  'lot-changed': (payload, { t }): Values => {
    const status = textOf(payload, 'permitStatus');
    if (status !== null) return { variant: 'permit', params: { status: t(`permit.${status}`) } };
    return { params: { fields: fieldWords(t, 'lotFields', textsOf(payload, 'fields')) } };
  },
  'tract-changed': (payload, { t }) => ({
    params: { name: textOf(payload, 'name') ?? '', fields: fieldWords(t, 'lotFields', textsOf(payload, 'fields')) },
  }),
  'person-invited': (payload, { t }) => ({
    params: { email: textOf(payload, 'email') ?? '', roles: roleWords(t, payload) },
  }),
  'person-joined': (payload, { t }) => ({ params: { roles: roleWords(t, payload) } }),
  'person-changed': (payload, { t }): Values =>
    typeof payload['isDisabled'] === 'boolean'
      ? { variant: payload['isDisabled'] ? 'disabled' : 'enabled', params: {} }
      : { params: { roles: roleWords(t, payload) } },
  'visit-begun': (payload) => ({ variant: payload['takenOver'] === true ? 'over' : undefined, params: {} }),
  'plan-chosen': (payload, { t }) => ({
    params: {
      system: systemWords(t, textOf(payload, 'system')),
      method: t(`holds.methods.${textOf(payload, 'method') ?? 'gauge'}`),
      medium: t(`holds.media.${textOf(payload, 'medium') ?? 'water'}`),
    },
  }),
  'test-started': (payload, { t }) => ({
    params: { test: testWords(t, payload), method: t(`holds.methods.${textOf(payload, 'method') ?? 'gauge'}`) },
  }),
  'test-ended': (payload, { t }) => ({
    params: { test: testWords(t, payload), reason: reasonWords(t, textOf(payload, 'reason') ?? '') },
  }),
  'reading-added': readingValues,
  outcome: outcomeValues,
  'plumbing-state': (payload, { t }) => ({
    params: {
      stage: textOf(payload, 'stageCode') ?? '',
      from: t(`marks.${textOf(payload, 'from') ?? 'not-tested'}`),
      to: t(`marks.${textOf(payload, 'to') ?? 'not-tested'}`),
    },
  }),
  'correction-opened': (payload, { t }) => ({
    params: {
      number: numberOf(payload, 'number') ?? 0,
      subject: textOf(payload, 'subject') === 'work' ? t('theWork') : systemWords(t, textOf(payload, 'subject')),
    },
  }),
  'closure-added': (payload, { t, time }) => {
    const [from, to] = [textOf(payload, 'from'), textOf(payload, 'to')];
    const date = textOf(payload, 'date') ?? '';
    const day = date === '' ? '' : time.date(date);
    const span = from === null || to === null ? t('wholeDay') : `${from}–${to}`;
    return { params: { day, span, why: textOf(payload, 'why') ?? '' } };
  },
  'closure-removed': (payload, { time }) => {
    const date = textOf(payload, 'date');
    return { params: { day: date === null ? '' : time.date(date) } };
  },
  'rule-card-published': (payload, { time }) => {
    const from = textOf(payload, 'effectiveFrom');
    return { params: { version: numberOf(payload, 'version') ?? 0, day: from === null ? '' : time.date(from) } };
  },
};

/** "Water, test 2" */
function testWords(t: Words, payload: Payload): string {
  return t('holds.testName', {
    system: systemWords(t, textOf(payload, 'system')),
    test: t('common.test', { ordinal: numberOf(payload, 'ordinal') ?? 1 }),
  });
}

function readingValues(payload: Payload, { t }: Told): Values {
  const system = systemWords(t, textOf(payload, 'system'));
  const levelIn = numberOf(payload, 'levelIn');
  if (levelIn !== null) return { variant: 'level', params: { system, inches: levelIn } };
  const isShut = textOf(payload, 'gaugeValve') === 'shut';
  return { variant: isShut ? 'shut' : undefined, params: { system, psi: numberOf(payload, 'pressurePsi') ?? 0 } };
}

function outcomeValues(payload: Payload, { t }: Told): Values {
  const kind = textOf(payload, 'kind') ?? 'fail';
  const reason = textOf(payload, 'reason');
  const systems = listOf(payload, 'systems').flatMap((one) => {
    if (typeof one !== 'object' || one === null) return [];
    const { system, answer } = one as { system?: unknown; answer?: unknown };
    if (typeof system !== 'string' || typeof answer !== 'string') return [];
    return [`${systemWords(t, system)} ${t(`marks.${answer}`)}`];
  });
  const detail = reason === null ? systems.join(', ') : reasonWords(t, reason);
  const params = { outcome: t(`marks.${kind}`), detail };
  return detail === '' ? { variant: 'bare', params } : { params };
}

function fieldWords(t: Words, group: 'lotFields', fields: readonly string[]): string {
  return fields.map((field) => t([`${group}.${field}`, 'lotFields.other'])).join(', ');
}

function roleWords(t: Words, payload: Payload): string {
  return textsOf(payload, 'roles')
    .map((role) => t(`common.roles.${role}`))
    .join(', ');
}
