import { dwvMethods, media, systems } from '../../holds/hold.states.js';
import { severities } from '../../outcomes/correction.states.js';
import type { RuleCardContent } from '../rule-card.content.js';
import { feeEvents } from '../rule-card.content.js';

/** A change of one field: its path, and the content with only that field changed. */
export interface OneChange {
  readonly path: string;
  readonly changed: RuleCardContent;
}

/** By the name of the field. */
const choices: Readonly<Record<string, readonly string[]>> = {
  ...{ acceptedMethods: dwvMethods, medium: media, systems, acceptFromPhoto: severities, event: feeEvents },
  ...{
    kind: ['above-highest-fitting', 'fill-level'],
    measuredAt: ['gauge', 'highest-outlet'],
    covers: ['slab', 'wall'],
  },
  ...{
    booking: ['self', 'desk'],
    whoMayRequest: ['superintendent', 'plumber'],
    whenNotUp: ['goes-to-standby', 'stays'],
  },
  ...{ levelSeenFrom: ['sight-tube', 'overflow'], payer: ['builder', 'plumber'] },
};
/** What only names another part, or the kind of a union: changed as a whole, not alone. */
const isName = (path: string): boolean =>
  /^(stages\.\d+\.code|tests\.\d+\.(stageCode|system)|readiness\.upBy\.kind)$/.test(path);

/** Every field of a rule card's content changed alone: numbers by one, yes to no, words by a letter, lists by one item fewer. */
export function everyChange(content: RuleCardContent): OneChange[] {
  return changesOf(content, '').map(({ path, value }) => ({ path, changed: value as RuleCardContent }));
}

interface Changed {
  path: string;
  value: unknown;
}

function changesOf(value: unknown, path: string): Changed[] {
  if (isName(path)) return [];
  if (Array.isArray(value)) {
    const items: unknown[] = value;
    const inside = items.flatMap((item, at) =>
      changesOf(item, `${path}.${at}`).map((one) => ({ path: one.path, value: items.with(at, one.value) })),
    );
    const fewer =
      items.length > 0 && !/^(stages|tests)$/.test(path) ? [{ path: `${path}[]`, value: items.slice(1) }] : [];
    return [...inside, ...fewer];
  }
  if (typeof value === 'object' && value !== null) {
    return Object.entries(value).flatMap(([name, part]) =>
      changesOf(part, path === '' ? name : `${path}.${name}`).map((one) => ({
        path: one.path,
        value: { ...value, [name]: one.value },
      })),
    );
  }
  return [{ path, value: otherThan(value, path) }];
}

function otherThan(value: unknown, path: string): unknown {
  if (typeof value === 'boolean') return !value;
  if (typeof value === 'number') return /[dD]ays\.\d+$/.test(path) ? (value % 7) + 1 : value + 1;
  if (typeof value !== 'string') return path.endsWith('headRule') ? { kind: 'fill-level', feet: null } : 7;
  if (/^\d\d:\d\d$/.test(value)) return value === '10:10' ? '10:20' : '10:10';
  if (/^\d{4}-\d\d-\d\d$/.test(value)) return '2027-06-15';
  const field = path.split('.').findLast((name) => Number.isNaN(Number(name))) ?? '';
  return choices[field]?.find((each) => each !== value) ?? `${value}x`;
}
