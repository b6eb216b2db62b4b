import { Injectable } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { createLot, LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { Actor } from '../common/access/actor.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import { AddLotsService, type LotDraft, refuseAdding } from './add-lots.service.js';
import { LotDetailPresenter } from './lot-detail.presenter.js';
import { refuseHalfPlace } from './place-on-earth.js';

type LotGiven = RouteInput<typeof createLot>['body'];

@Injectable()
export class CreateLotService {
  constructor(
    private readonly adding: AddLotsService,
    private readonly detail: LotDetailPresenter,
    private readonly unitOfWork: UnitOfWork,
  ) {}

  /** Throws `not-found`, `not-allowed`, `bad-input`, `lot-number-taken`. */
  async create(actor: Actor, given: LotGiven): Promise<LotDetail> {
    return this.unitOfWork.run(async () => {
      refuseAdding(actor, given.builderId);
      refuseHalfPlace(given.latitude ?? null, given.longitude ?? null);
      await this.adding.refuseTies(given);
      const [lotId = ''] = await this.adding.add(actor, [draftOf(given)], given);
      return this.detail.present(actor, lotId);
    });
  }
}

function draftOf(given: LotGiven): LotDraft {
  return {
    number: given.number,
    address: given.address,
    latitude: given.latitude ?? null,
    longitude: given.longitude ?? null,
    permitNumber: given.permit?.number || null,
    permitStatus: given.permit?.status ?? 'not-applied',
    permitHolder: given.permit?.holder || null,
    mayPlumberRequest: given.mayPlumberRequest ?? false,
    coverDate: given.coverDate ?? null,
    gateCode: given.access?.gateCode || null,
    contactName: given.access?.contactName || null,
    contactPhone: given.access?.contactPhone ?? null,
    hazards: given.access?.hazards || null,
    // a house of one dwelling is known by its number alone; words for it are the page's
    unitLabels: given.units?.map(({ label }) => label) ?? ['1'],
  };
}
