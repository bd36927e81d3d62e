import { Passport } from 'passport';
import { Strategy as LocalStrategy } from 'passport-local';
import type { Request, RequestHandler, Response } from 'express';
import type { AppContext } from '../context.ts';
import { findPersonByEmail } from './people.queries.ts';
import { verifyPassword } from './passwords.ts';

declare global {
  // eslint-disable-next-line @typescript-eslint/no-namespace -- Passport's way of typing what it keeps
  namespace Express {
    interface User {
      id: string;
    }
  }
}

/** Sign-in with e-mail and password by Passport; the session holds only the person's id. */
export interface SignIn {
  /** Restores the person of a session. */
  middleware: RequestHandler;
  /** The person of these credentials, or null; a wrong address takes as long as a wrong password. */
  check(request: Request): Promise<{ id: string } | null>;
}

export function makeSignIn({ db }: AppContext): SignIn {
  const passport = new Passport();
  passport.use(
    new LocalStrategy({ usernameField: 'email' }, (email, password, done) => {
      findPersonByEmail(db, email)
        .then(async (person) => ((await verifyPassword(person?.password_hash, password)) && person ? person : null))
        .then((person) => done(null, person ? { id: person.id } : false), done);
    }),
  );
  passport.serializeUser((user, done) => done(null, user.id));
  passport.deserializeUser((id: string, done) => done(null, { id }));

  return {
    middleware: passport.session(),
    check: (request) =>
      new Promise((resolve, reject) => {
        const answer = (error: unknown, user?: { id: string } | false) =>
          error ? reject(error instanceof Error ? error : new Error('sign-in failed')) : resolve(user || null);
        const run = passport.authenticate('local', { session: false }, answer) as RequestHandler;
        void run(request, {} as Response, (error) => reject(error as Error));
      }),
  };
}

/** Puts the person into a fresh session: its number changes at sign-in, what the visitor said of their age stays. */
export function openSessionFor(request: Request, user: { id: string }): Promise<void> {
  const ageConfirmed = request.session.ageConfirmed;
  return new Promise((resolve, reject) => {
    request.logIn(user, (error: unknown) => {
      if (error) return reject(error as Error);
      if (ageConfirmed !== undefined) request.session.ageConfirmed = ageConfirmed;
      request.session.save((failure: unknown) => (failure ? reject(failure as Error) : resolve()));
    });
  });
}

export function closeSession(request: Request): Promise<void> {
  return new Promise((resolve, reject) =>
    request.session.destroy((error: unknown) => (error ? reject(error as Error) : resolve())),
  );
}
