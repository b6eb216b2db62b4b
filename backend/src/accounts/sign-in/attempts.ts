import { Injectable } from '@nestjs/common';
import type { Request } from 'express';
import { RefreshCookie } from '../sessions/refresh-cookie.js';
import { clientAddressOf } from './client-address.js';
import type { Attempt } from './sign-in.service.js';

/** What a request tells of whoever tries to come in. */
@Injectable()
export class Attempts {
  constructor(private readonly cookie: RefreshCookie) {}

  of(request: Request): Attempt {
    return { address: clientAddressOf(request), earlierToken: this.cookie.find(request) };
  }
}
