import { type ExecutionContext, Injectable } from '@nestjs/common';
import { Reflector } from '@nestjs/core';
import { AuthGuard } from '@nestjs/passport';
import { refuse } from '../errors/app-error.js';
import { currentRequest } from '../request/request-context.js';
import { ACCESS, type Access } from './access.js';
import type { Actor } from './actor.js';

/** Default closed: a route without a declared access is refused, everything but `anyone` needs a good token. */
@Injectable()
export class AccessGuard extends AuthGuard('jwt') {
  constructor(private readonly reflector: Reflector) {
    super();
  }

  override async canActivate(context: ExecutionContext): Promise<boolean> {
    if (context.getType() !== 'http') return true;
    const access = this.reflector.get<Access | undefined>(ACCESS, context.getHandler());
    if (access === undefined) refuse('not-found');
    if (access.kind === 'anyone') return true;
    await super.canActivate(context);
    const actor = context.switchToHttp().getRequest<{ user: Actor }>().user;
    const request = currentRequest();
    if (request) request.actor = actor;
    if (access.kind === 'operator' && !actor.isOperator) refuse('not-found');
    return true;
  }

  override handleRequest<T>(error: unknown, user: T | false): T {
    if (error instanceof Error) throw error;
    return user || refuse('signed-out');
  }
}
