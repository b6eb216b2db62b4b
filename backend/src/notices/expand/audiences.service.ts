import { Injectable } from '@nestjs/common';
import type { Audience } from '../notice.rules.js';
import type { OutboxEventModel } from '../outbox-event.model.js';
import { EventFactsQueries, type LotFacts, type PersonRow, type VisitFacts } from './event-facts.queries.js';

export interface EventAudience {
  people: Partial<Record<Audience, string[]>>;
  byId: Map<string, PersonRow>;
}

/** Finds the people an event concerns, by their relation to it. */
@Injectable()
export class Audiences {
  constructor(private readonly facts: EventFactsQueries) {}

  async of(event: OutboxEventModel, lot: LotFacts | null, visit: VisitFacts | null): Promise<EventAudience> {
    if (event.kind.startsWith('consent-')) return this.ofConsent(event, lot);
    if (event.kind === 'rule-card-published') return this.ofRuleCard(String(event.payload.departmentId));
    return lot ? this.ofLot(event, lot, visit) : { people: {}, byId: new Map() };
  }

  private async ofLot(event: OutboxEventModel, lot: LotFacts, visit: VisitFacts | null): Promise<EventAudience> {
    const members = await this.facts.listMembers([lot.builderId, lot.plumberId, lot.departmentId]);
    const openerId =
      typeof event.payload.correctionId === 'string' ? await this.facts.findOpenerId(event.payload.correctionId) : null;
    const former = event.kind === 'handover' ? await this.formerOf(event) : [];
    const inspectorId = visit?.inspectorId ?? formerInspectorOf(event);
    return {
      people: {
        superintendents: idsOf(members, lot.builderId, 'superintendent'),
        plumbers: idsOf(members, lot.plumberId, 'plumber'),
        desk: idsOf(members, lot.departmentId, 'desk'),
        inspector: members.filter(({ id }) => id === inspectorId).map(({ id }) => id),
        opener: members.filter(({ id }) => id === openerId).map(({ id }) => id),
        former: former.filter(({ id }) => !members.some((each) => each.id === id)).map(({ id }) => id),
      },
      byId: byId([...members, ...former]),
    };
  }

  /** Those who spoke for an organization on a lot it is no longer on. */
  private async formerOf(event: OutboxEventModel): Promise<PersonRow[]> {
    const members = await this.facts.listMembers([String(event.payload.formerId)]);
    return members.filter(({ roles }) => roles.some((role) => ['superintendent', 'plumber', 'owner'].includes(role)));
  }

  private async ofConsent(event: OutboxEventModel, lot: LotFacts | null): Promise<EventAudience> {
    const askedId = String(event.payload.organizationId);
    const members = await this.facts.listMembers([askedId, lot?.builderId ?? null]);
    const asked = members.filter(({ organizationId }) => organizationId === askedId);
    return {
      people: {
        asked: asked
          .filter(({ roles }) => roles.some((role) => ['superintendent', 'plumber', 'desk', 'owner'].includes(role)))
          .map(({ id }) => id),
        superintendents: idsOf(members, lot?.builderId ?? null, 'superintendent'),
      },
      byId: byId(members),
    };
  }

  private async ofRuleCard(departmentId: string): Promise<EventAudience> {
    const concerned = await this.facts.listOrganizationsWithOpenVisit(departmentId);
    const members = await this.facts.listMembers([...concerned, departmentId]);
    const inRole = (role: string) => members.filter(({ roles }) => roles.includes(role)).map(({ id }) => id);
    return {
      people: {
        superintendents: inRole('superintendent'),
        plumbers: inRole('plumber'),
        inspector: inRole('inspector'),
        desk: inRole('desk'),
      },
      byId: byId(members),
    };
  }
}

/** A visit that goes back to the requests has no inspector any more; the one it had is told all the same. */
function formerInspectorOf(event: OutboxEventModel): string | null {
  const visit = event.payload.visit as { formerInspectorId?: string | null } | undefined;
  return visit?.formerInspectorId ?? null;
}

function idsOf(members: readonly PersonRow[], organizationId: string | null, role: string): string[] {
  return members
    .filter((each) => each.organizationId === organizationId && each.roles.includes(role))
    .map(({ id }) => id);
}

/** A person of two organizations is told once, as a member of the first. */
function byId(members: readonly PersonRow[]): Map<string, PersonRow> {
  const people = new Map<string, PersonRow>();
  for (const each of members) if (!people.has(each.id)) people.set(each.id, each);
  return people;
}
