import { Injectable } from '@nestjs/common';
import { hash, verify } from '@node-rs/argon2';

// OWASP Password Storage Cheat Sheet: argon2id (the package's default) with 19 MiB, two passes,
// one lane.
const parameters = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** Of no password anyone knows; checked for unknown accounts so that they take as long. */
const decoy = hash(crypto.randomUUID(), parameters);

@Injectable()
export class PasswordHasher {
  /** argon2id hash in the PHC string format. */
  hash(password: string): Promise<string> {
    return hash(password, parameters);
  }

  /** Whether the password fits; null (no such account) never does but costs the same time. */
  async verify(passwordHash: string | null, password: string): Promise<boolean> {
    const fits = await verify(passwordHash ?? (await decoy), password);
    return passwordHash !== null && fits;
  }
}
