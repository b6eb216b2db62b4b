import { Injectable } from '@nestjs/common';

/** A closure as it was added; whole day where `from` and `to` are null, else clock times `07:30` of the department's day. */
export interface AddedClosure {
  readonly id: string;
  readonly departmentId: string;
  readonly zone: string;
  readonly date: string;
  readonly from: string | null;
  readonly to: string | null;
  readonly why: string;
  /** Who closed, with the role it was done in. */
  readonly actor: { readonly personId: string; readonly role: string };
}

export interface ClosureListener {
  /** Runs inside the unit of work of the closure: what throws here undoes the closure too. */
  afterClosureAdded(closure: AddedClosure): Promise<void>;
}

/**
 * Where later modules say what a closure does to what is theirs. They call `register` in `onModuleInit`; events of the process would come
 * too late, as they are not part of the transaction.
 */
@Injectable()
export class ClosureEffects {
  private readonly listeners: ClosureListener[] = [];

  register(listener: ClosureListener): void {
    this.listeners.push(listener);
  }

  async afterClosureAdded(closure: AddedClosure): Promise<void> {
    for (const listener of this.listeners) await listener.afterClosureAdded(closure);
  }
}
