import { Module } from '@nestjs/common';
import { CalcController } from './calc.controller.js';

/** What is computed of a house and a rule card. */
@Module({ controllers: [CalcController] })
export class PlansModule {}
