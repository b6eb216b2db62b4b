import { z } from 'zod';

export const locales = ['en', 'es'] as const;
export const locale = z.enum(locales);
export type Locale = z.infer<typeof locale>;
