import type { INestApplication } from '@nestjs/common';
import { NestFactory } from '@nestjs/core';
import { getConnectionToken } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize-typescript';
import { AccessTokens } from '../../accounts/tokens/access-tokens.js';
import { appOptions, furnish } from '../../app.factory.js';
import { AppModule } from '../../app.module.js';
import { SettableClock } from '../../common/time/clock.js';
import type { Environment } from '../../config/environment.js';
import { Outbox } from '../../notices/outbox.service.js';
import { DemoClient } from './demo-client.js';
import { layFoundation } from './demo-foundation.js';
import { DemoStage } from './demo-stage.js';
import { tellStory } from './demo-story.js';

/** How far back the story begins. */
const storyDays = 90;

/**
 * Tells the demo's past through the server's own routes, each act under its own time, with nobody told of it: the outbox is muted.
 * Answers how many acts were played.
 */
export async function makeDemo(environment: Environment, present: Date): Promise<number> {
  const since = new Date(present.getTime() - storyDays * 86_400_000);
  const clock = new SettableClock(since);
  const app = await NestFactory.create(
    AppModule.of({ ...environment, ROLE: 'web', LOG_LEVEL: 'error', STATIC_DIR: undefined }, clock),
    appOptions,
  );
  furnish(app, { ...environment, STATIC_DIR: undefined });
  try {
    await app.listen(0, '127.0.0.1');
    app.get(Outbox).isMuted = true;
    return await play(app, clock, since, present);
  } finally {
    await app.close();
  }
}

async function play(app: INestApplication, clock: SettableClock, since: Date, present: Date): Promise<number> {
  const foundation = await layFoundation(
    app.get<Sequelize>(getConnectionToken()),
    since,
    new Date(present.getTime() + 60_000),
  );
  const tokens = app.get(AccessTokens);
  const client = new DemoClient((await app.getUrl()).replace('[::1]', '127.0.0.1'), (key) =>
    Promise.resolve(tokens.issue(foundation.personId(key), foundation.sessionId(key)).accessToken),
  );
  const stage = new DemoStage(clock, present);
  await tellStory(client, stage, foundation, present);
  return stage.play();
}
