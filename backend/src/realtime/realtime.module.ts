import { Module } from '@nestjs/common';
import { AccountsModule } from '../accounts/accounts.module.js';
import { LotsModule } from '../lots/lots.module.js';
import { RealtimeGateway } from './realtime.gateway.js';

/** Sockets: who looks at what, and what they should fetch anew. */
@Module({ imports: [AccountsModule, LotsModule], providers: [RealtimeGateway] })
export class RealtimeModule {}
