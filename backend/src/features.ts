import type { Type } from '@nestjs/common';
import { AccountsModule } from './accounts/accounts.module.js';

/** The modules with domain words, in the order their imports may go. */
export const features: Type[] = [AccountsModule];
