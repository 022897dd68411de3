import { Injectable } from '@nestjs/common';

import { Problem } from '#common/errors/problem';
import type { CurrentUser } from '#common/schemas/auth';
import { isUniqueViolation } from '#server/database/database-errors';
import type { Executor } from '#server/database/database';

import { PasswordHasher } from './password-hasher.js';
import { initialsOf } from './person.presenter.js';
import type { UserRow } from './user.table.js';
import { UsersRepository } from './users.repository.js';

export interface NewUser {
  readonly name: string;
  readonly email: string;
  readonly password: string;
}

@Injectable()
export class UsersService {
  constructor(
    private readonly repository: UsersRepository,
    private readonly hasher: PasswordHasher,
  ) {}

  /**
   * Makes an account; whoever lets people choose a password checks its strength first.
   * @throws {Problem} `member.already` when the address has an account
   */
  async createUser(user: NewUser, executor?: Executor): Promise<UserRow> {
    const passwordHash = await this.hasher.hash(user.password);
    try {
      return await this.repository.insert(
        { name: user.name, email: user.email.toLowerCase(), passwordHash },
        executor,
      );
    } catch (error) {
      if (isUniqueViolation(error, 'users_email')) {
        throw new Problem('member.already', 'This address has an account: sign in with it.');
      }
      throw error;
    }
  }

  findById(id: string): Promise<UserRow | null> {
    return this.repository.findById(id);
  }

  findByEmail(email: string, executor?: Executor): Promise<UserRow | null> {
    return this.repository.findByEmail(email, executor);
  }

  /** Whether anyone has an account here. */
  hasAny(executor?: Executor): Promise<boolean> {
    return this.repository.hasAny(executor);
  }

  rename(id: string, name: string): Promise<void> {
    return this.repository.rename(id, name);
  }

  async setPassword(id: string, password: string, at: Date): Promise<void> {
    await this.repository.setPassword(id, await this.hasher.hash(password), at);
  }

  /** Whether the password is the person's; takes as long when there is no such person. */
  passwordFits(user: UserRow | null, password: string): Promise<boolean> {
    return this.hasher.verify(user?.passwordHash ?? null, password);
  }

  /** The person as they see themselves, null when the account is gone. */
  async currentUser(id: string): Promise<CurrentUser | null> {
    const user = await this.repository.findById(id);
    return user === null
      ? null
      : {
          id: user.id,
          name: user.name,
          initials: initialsOf(user.name),
          email: user.email,
          memberships: await this.repository.memberships(user.id),
        };
  }
}
