import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { LotsModule } from '../lots/lots.module.js';
import { CommentModel } from './comment.model.js';
import { CommentSubjects } from './comment-subjects.js';
import { CommentsQueries } from './comments.queries.js';
import { Comments } from './comments.service.js';
import { ThreadsController } from './threads.controller.js';

/** A lot's conversation. */
@Module({
  imports: [SequelizeModule.forFeature([CommentModel]), LotsModule],
  controllers: [ThreadsController],
  providers: [Comments, CommentsQueries, CommentSubjects],
  exports: [CommentsQueries],
})
export class ThreadsModule {}
