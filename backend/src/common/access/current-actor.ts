import { createParamDecorator, type ExecutionContext } from '@nestjs/common';
import { refuse } from '../errors/app-error.js';
import type { Actor } from './actor.js';

/** The signed-in person of a request. Throws `signed-out` when there is none. */
export const CurrentActor = createParamDecorator((_data: unknown, context: ExecutionContext): Actor => {
  const actor = context.switchToHttp().getRequest<{ user?: Actor }>().user;
  return actor ?? refuse('signed-out');
});
