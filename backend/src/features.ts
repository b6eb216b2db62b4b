import type { Type } from '@nestjs/common';

/** The modules with domain words, in the order their imports may go. */
export const features: Type[] = [];
