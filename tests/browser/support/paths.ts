import type { WorldPerson } from '@holdwater/backend/testing/fixtures/world.js';
import type { Scene } from './scene.js';
import type { Stack } from './stack.js';

/** The pages each role has, as addresses; null is nobody signed in. */
export function pathsOf(stack: Stack, scene: Scene): Array<{ person: WorldPerson | null; paths: string[] }> {
  const { world } = stack;
  const ruleCard = `/rule-cards/${world.ruleCard.id}`;
  const [failedLot, readyLot] = [scene.failed.lotId, scene.ready.lotId];
  const date = scene.underway.window.date;
  return [
    {
      person: null,
      paths: [
        '/sign-in',
        '/sign-in?ask=link',
        '/sign-in?ask=reset',
        '/link/sign-in',
        '/rule-cards',
        ruleCard,
        '/no-such-page',
      ],
    },
    {
      person: 'superintendent',
      paths: [
        ...[`/calendar?date=${date}`, `/calendar?request=${world.lots[5].id}`, `/calendar?visit=${scene.booked.id}`],
        ...['/lots', '/lots/new', '/lots/import', `/lots/${failedLot}`, `/lots/${readyLot}`, `/lots/${readyLot}/edit`],
        ...[`/lots/${readyLot}/thread`, '/corrections', '/notices', '/settings', '/consents', '/rule-cards', ruleCard],
        ...['/lots/houses', '/lots/houses/new', '/past-lots'],
      ],
    },
    { person: 'builderOwner', paths: ['/people'] },
    {
      person: 'plumber',
      paths: [
        ...[`/calendar?date=${date}`, '/lots', `/lots/${failedLot}`, `/lots/${scene.booked.lotId}/test`],
        ...[`/lots/${readyLot}/test`, `/lots/${failedLot}/thread`, '/corrections', '/consents', '/notices'],
        ...[`/lots/${readyLot}/plan`, `/lots/${failedLot}/plan`],
      ],
    },
    { person: 'helper', paths: [`/lots/${readyLot}/test`] },
    {
      person: scene.inspector,
      paths: [
        ...[`/run?date=${date}`, '/run', `/visits/${scene.underway.id}/outcome`, `/visits/${scene.failed.id}/outcome`],
        ...[`/calendar?date=${date}`, '/lots', `/lots/${failedLot}`],
      ],
    },
    { person: 'desk', paths: [`/day?date=${date}`, '/day', '/requests', '/lots', '/rule-cards', ruleCard] },
    { person: 'otherDesk', paths: ['/requests', `/day?date=${scene.requested.window.date}`] },
    { person: 'operator', paths: ['/operations/organizations', '/operations/deliveries', '/operations/ledger'] },
  ];
}
