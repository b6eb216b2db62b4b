import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import type { Actor } from '../../common/access/actor.js';
import { Clock } from '../../common/time/clock.js';
import { type AccessClaims, AccessTokens } from '../tokens/access-tokens.js';

const actorSql = `
  SELECT p.id AS "personId", s.id AS "sessionId", p.name, p.is_operator AS "isOperator",
    coalesce(json_agg(json_build_object('organizationId', o.id, 'kind', o.kind, 'roles', m.roles) ORDER BY m.created_at, m.id)
      FILTER (WHERE m.id IS NOT NULL), '[]') AS memberships
  FROM sessions s
  JOIN persons p ON p.id = s.person_id
  LEFT JOIN memberships m ON m.person_id = p.id AND NOT m.is_disabled
  LEFT JOIN organizations o ON o.id = m.organization_id
  WHERE s.id = :sessionId AND p.id = :personId AND s.ended_at IS NULL AND s.expires_at > :now AND NOT p.is_disabled
  GROUP BY p.id, s.id`;

/** Who stands behind a token right now. Asked anew at every request, so that whoever is disabled or signed out is out at once. */
@Injectable()
export class Authentication {
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    private readonly tokens: AccessTokens,
    private readonly clock: Clock,
  ) {}

  /** For the sockets: the actor of an access token, or null. */
  async findActorOfToken(token: string): Promise<Actor | null> {
    const claims = this.tokens.find(token);
    return claims && this.findActor(claims);
  }

  async findActor({ personId, sessionId }: AccessClaims): Promise<Actor | null> {
    const [actor] = await this.sequelize.query<Actor>(actorSql, {
      replacements: { personId, sessionId, now: this.clock.now() },
      type: QueryTypes.SELECT,
    });
    return actor ?? null;
  }
}
