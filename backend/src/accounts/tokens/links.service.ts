import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Op, Transaction } from 'sequelize';
import { refuse } from '../../common/errors/app-error.js';
import { Clock } from '../../common/time/clock.js';
import { LinkTokenModel } from '../link-token.model.js';
import { hashOfSecret, newSecret } from './secrets.js';

export type LinkKind = LinkTokenModel['kind'];

/** How long a link is good for. */
export const linkMinutes: Record<LinkKind, number> = { 'sign-in': 10, reset: 10, invitation: 7 * 24 * 60 };

/** More open links than this for one person within their time are not mailed: an inbox is not to be flooded by a stranger. */
export const mostOpenLinks = 3;

/** Secrets sent by mail, kept as hashes, good once and for a while. Inside the unit of work of what they open. */
@Injectable()
export class Links {
  constructor(
    @InjectModel(LinkTokenModel) private readonly links: typeof LinkTokenModel,
    private readonly clock: Clock,
  ) {}

  async issue(
    kind: LinkKind,
    subject: { personId: string } | { invitationId: string },
    minutes = linkMinutes[kind],
  ): Promise<string> {
    const token = newSecret();
    const now = this.clock.now();
    const expiresAt = new Date(now.getTime() + minutes * 60_000);
    await this.links.create({
      id: randomUUID(),
      kind,
      tokenHash: hashOfSecret(token),
      ...subject,
      createdAt: now,
      expiresAt,
      usedAt: null,
    });
    return token;
  }

  /** The link of a token that is good still, without using it up. Throws `link-expired` when it is unknown, used or over. */
  async getGood(kind: LinkKind, token: string): Promise<LinkTokenModel> {
    return this.assertGood(await this.links.findOne({ where: { kind, tokenHash: hashOfSecret(token) } }));
  }

  /** Uses a link up; of two at once one wins. Throws `link-expired` as `getGood`. */
  async take(kind: LinkKind, token: string): Promise<LinkTokenModel> {
    const where = { kind, tokenHash: hashOfSecret(token) };
    const link = this.assertGood(await this.links.findOne({ where, lock: Transaction.LOCK.UPDATE }));
    return link.update({ usedAt: this.clock.now() });
  }

  async countOpen(kind: LinkKind, personId: string): Promise<number> {
    return this.links.count({ where: { kind, personId, usedAt: null, expiresAt: { [Op.gt]: this.clock.now() } } });
  }

  /** Whatever was mailed before to sign in or to reset is void once the password is another. */
  async voidAllOf(personId: string): Promise<void> {
    await this.links.update({ usedAt: this.clock.now() }, { where: { personId, usedAt: null } });
  }

  private assertGood(link: LinkTokenModel | null): LinkTokenModel {
    return link && link.usedAt === null && link.expiresAt > this.clock.now() ? link : refuse('link-expired');
  }
}
