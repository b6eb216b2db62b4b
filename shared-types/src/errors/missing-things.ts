/** What a 404 may name: "No such lot for you". Missing and foreign are told by the same word, so that neither gives the other away. */
export const missingThings = [
  'lot',
  'visit',
  'plan',
  'test',
  'reading',
  'correction',
  'comment',
  'tract',
  'house-model',
  'unit',
  'rule-card',
  'department',
  'organization',
  'person',
  'invitation',
  'closure',
  'delivery',
] as const;
export type MissingThing = (typeof missingThings)[number];

const byParameter: Readonly<Record<string, MissingThing>> = {
  lotId: 'lot',
  visitId: 'visit',
  planId: 'plan',
  holdId: 'test',
  readingId: 'reading',
  correctionId: 'correction',
  commentId: 'comment',
  tractId: 'tract',
  houseModelId: 'house-model',
  ruleCardId: 'rule-card',
  departmentId: 'department',
  organizationId: 'organization',
  personId: 'person',
  invitationId: 'invitation',
  closureId: 'closure',
  deliveryId: 'delivery',
};

/** Routes whose path names nothing: what their query or body names. */
const byPath: Readonly<Record<string, MissingThing>> = {
  '/api/visits': 'lot',
  '/api/visits/offers': 'lot',
  '/api/consents': 'lot',
  '/api/lots': 'organization',
  '/api/lots/import': 'organization',
  '/api/tracts': 'organization',
  '/api/house-models': 'organization',
  '/api/calendar': 'organization',
  '/api/waiting': 'organization',
  '/api/corrections': 'organization',
};

/**
 * What a route is about, by the last thing its path names; null where it names none. One answer for a whole route: a foreign lot behind a
 * reading must look like a reading that is not there.
 */
export function missingThingOf(path: string): MissingThing | null {
  const named = path.split('/').flatMap((part) => (part.startsWith(':') ? (byParameter[part.slice(1)] ?? []) : []));
  return named.at(-1) ?? byPath[path] ?? null;
}
