import { Inject, Injectable } from '@nestjs/common';
import type { Request, Response } from 'express';

import { Problem } from '#common/errors/problem';
import type { SignInRequest } from '#common/schemas/auth';
import { AuditService } from '#server/audit/audit.service';
import { APP_CONFIG, type AppConfig } from '#server/config/environment';
import type { UserContext } from '#server/http/request-context';
import { UsersService } from '#server/users/users.service';

import {
  cookieValue,
  issueKnownBrowser,
  knownBrowserCookie,
  knownBrowserMs,
  readKnownBrowser,
} from './known-browser.js';
import { sessionCookieName } from './session-limits.js';
import { SessionsService } from './sessions.service.js';
import { SignInAttemptRepository, type AttemptKey } from './sign-in-attempt.repository.js';

@Injectable()
export class SignInService {
  constructor(
    private readonly users: UsersService,
    private readonly sessions: SessionsService,
    private readonly attempts: SignInAttemptRepository,
    private readonly audit: AuditService,
    @Inject(APP_CONFIG) private readonly config: AppConfig,
  ) {}

  /**
   * Signs in with e-mail and password.
   * @returns the person's id
   * @throws {Problem} `auth.slowed` after too many failures, `auth.bad_credentials`
   */
  async signIn(request: Request, response: Response, asked: SignInRequest): Promise<string> {
    const keys = this.attemptKeys(request, asked.email);
    await this.beginAttempt(keys);
    const user = await this.users.findByEmail(asked.email);
    const address = request.ip ?? null;
    if (!(await this.users.passwordFits(user, asked.password)) || user === null) {
      if (user !== null) {
        await this.audit.record({ userId: user.id, address }, 'auth.sign_in_failed');
      }
      throw new Problem('auth.bad_credentials');
    }
    await this.attempts.succeed(keys);
    await this.open(request, response, user);
    return user.id;
  }

  /** Starts a session for someone who has just proved who they are. */
  async open(
    request: Request,
    response: Response,
    user: { id: string; email: string },
  ): Promise<void> {
    await this.sessions.start(request, user.id);
    response.cookie(
      knownBrowserCookie,
      issueKnownBrowser(user.email.toLowerCase(), this.config.sessionSecret),
      {
        httpOnly: true,
        sameSite: 'lax',
        secure: request.secure,
        path: '/api',
        maxAge: knownBrowserMs,
      },
    );
    await this.audit.record({ userId: user.id, address: request.ip ?? null }, 'auth.sign_in');
  }

  /** Ends the session and takes its cookie back; the browser stays known. */
  async signOut(request: Request, response: Response, context: UserContext): Promise<void> {
    await this.sessions.end(request);
    response.clearCookie(sessionCookieName, { path: '/' });
    await this.audit.record(context, 'auth.sign_out');
  }

  /** Asks for the password again before something sensitive; guesses are slowed here too. */
  async confirmPassword(userId: string, password: string): Promise<void> {
    const keys: AttemptKey[] = [{ kind: 'account', value: `confirm ${userId}` }];
    await this.beginAttempt(keys);
    if (!(await this.users.passwordFits(await this.users.findById(userId), password))) {
      throw new Problem('auth.bad_credentials', 'The current password is not right.', {
        fields: [
          {
            code: 'auth.bad_credentials',
            field: 'currentPassword',
            message: 'This is not your current password.',
          },
        ],
      });
    }
    await this.attempts.succeed(keys);
  }

  private attemptKeys(request: Request, email: string): AttemptKey[] {
    const cookie = cookieValue(request.get('cookie'), knownBrowserCookie);
    const browser = readKnownBrowser(cookie, email, this.config.sessionSecret);
    return browser === null
      ? [
          { kind: 'account', value: email },
          { kind: 'address', value: request.ip ?? '' },
        ]
      : [{ kind: 'browser', value: browser }];
  }

  private async beginAttempt(keys: readonly AttemptKey[]): Promise<void> {
    const waitMs = await this.attempts.begin(keys);
    if (waitMs > 0) {
      const retryAfterSeconds = Math.ceil(waitMs / 1000);
      throw new Problem(
        'auth.slowed',
        `Too many tries. Wait ${retryAfterSeconds} s before the next one.`,
        { retryAfterSeconds },
      );
    }
  }
}
