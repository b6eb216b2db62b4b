import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { Comment, writeComment } from '@holdwater/shared-types/threads/thread.contract.js';
import type { Actor } from '../common/access/actor.js';
import { Changes } from '../common/changes/changes.js';
import { refuse } from '../common/errors/app-error.js';
import { correctedMadeAt } from '../common/request/made-at.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { Ledger } from '../ledger/ledger.service.js';
import { LotsQueries } from '../lots/lots.queries.js';
import { actingRole, canComment } from '../lots/lots.policy.js';
import { Outbox } from '../notices/outbox.service.js';
import { CommentModel } from './comment.model.js';
import { CommentSubjects } from './comment-subjects.js';
import { CommentsQueries } from './comments.queries.js';

/** How much of a comment a notice quotes. */
const excerptLength = 160;

type Written = RouteInput<typeof writeComment>['body'];

@Injectable()
export class Comments {
  constructor(
    @InjectModel(CommentModel) private readonly comments: typeof CommentModel,
    private readonly lots: LotsQueries,
    private readonly queries: CommentsQueries,
    private readonly subjects: CommentSubjects,
    private readonly unitOfWork: UnitOfWork,
    private readonly ledger: Ledger,
    private readonly outbox: Outbox,
    private readonly changes: Changes,
    private readonly clock: Clock,
  ) {}

  /** Writes to the lot's thread. A repeated client id answers the comment that is there. */
  async write(actor: Actor, lotId: string, written: Written): Promise<Comment> {
    return this.unitOfWork.run(async () => {
      const lot = await this.lots.lockLotFor(actor, lotId);
      if (!canComment(actor, lot)) refuse('not-allowed');
      const earlier = await this.comments.findOne({ where: { clientId: written.clientId } });
      if (earlier) return this.sameAgain(actor, lotId, earlier);
      if (written.on) await this.subjects.check(lotId, written.on);
      const comment = await this.add(actor, lotId, written, actingRole(actor, lot));
      return this.queries.getComment(comment.id);
    });
  }

  private async sameAgain(actor: Actor, lotId: string, earlier: CommentModel): Promise<Comment> {
    if (earlier.authorId !== actor.personId || earlier.lotId !== lotId) refuse('not-found');
    return this.queries.getComment(earlier.id);
  }

  private async add(actor: Actor, lotId: string, written: Written, role: string | null): Promise<CommentModel> {
    const now = this.clock.now();
    const comment = await this.comments.create({
      id: randomUUID(),
      clientId: written.clientId,
      lotId,
      text: written.text,
      onKind: written.on?.kind ?? null,
      onId: written.on?.id ?? null,
      authorId: actor.personId,
      authorRole: role,
      madeAt: correctedMadeAt(written.madeAt, now),
      receivedAt: now,
    });
    await this.ledger.appendToLot(lotId, 'comment', { commentId: comment.id }, { personId: actor.personId, role });
    await this.outbox.add(
      'comment',
      { lotId, actorId: actor.personId },
      { commentId: comment.id, excerpt: written.text.slice(0, excerptLength) },
    );
    this.changes.lot(lotId, 'thread');
    return comment;
  }
}
