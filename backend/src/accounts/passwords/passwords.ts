import { Injectable } from '@nestjs/common';
import { hash, verify } from '@node-rs/argon2';

/** argon2id (what the library does unless told otherwise) with 46 MiB, one pass, one lane: the smallest OWASP gives for one pass (ASVS 5.0 appendix C; Password Storage Cheat Sheet). */
const argon2 = { memoryCost: 47_104, timeCost: 1, parallelism: 1 };

/** Hashes passwords and checks them. Slow by purpose: never inside a transaction. */
@Injectable()
export class Passwords {
  private decoy: Promise<string> | null = null;

  hash(password: string): Promise<string> {
    return hash(password, argon2);
  }

  /** Where there is no hash, as for an unknown address, the same work is done, so that time does not tell; the answer is no. */
  async isRight(passwordHash: string | null, password: string): Promise<boolean> {
    this.decoy ??= this.hash('a password that nobody has');
    const isRight = await verify(passwordHash ?? (await this.decoy), password);
    return passwordHash !== null && isRight;
  }
}
