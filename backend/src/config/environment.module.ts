import { type DynamicModule, Global, Module } from '@nestjs/common';
import type { Environment } from './environment.js';

export const ENVIRONMENT = Symbol('environment');

/** The environment, read and checked once, given to whoever asks for `ENVIRONMENT`. Nobody else reads `process.env`. */
@Global()
@Module({})
export class EnvironmentModule {
  static of(environment: Environment): DynamicModule {
    return {
      module: EnvironmentModule,
      providers: [{ provide: ENVIRONMENT, useValue: environment }],
      exports: [ENVIRONMENT],
    };
  }
}
