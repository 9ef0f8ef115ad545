import { randomBytes } from 'node:crypto';

import type { Request, RequestHandler, Response } from 'express';
import session from 'express-session';
import passport from 'passport';

import { isHttps } from '../config/config';
import type { Actor, Edges } from '../context/context';
import { bookkeeping } from '../context/transact';
import { findActor, findActorByEmail } from './actor-queries';
import { passwordHashOf, storePasswordHash } from './credential-repository';
import { checkAgainstNobody, hashPassword, isPasswordRight, isWeakerThanNow } from './passwords';
import { endOldestSessions } from './session-repository';
import { SessionStore } from './session-store';

const MAX_SESSIONS_PER_PERSON = 5;

export interface Credentials {
  readonly email: string;
  readonly password: string;
}

/** The door of the product: sessions, and passport with our own check of the password. */
export interface Gate {
  readonly handlers: readonly RequestHandler[];
  readonly store: SessionStore;
  readonly sessionCookie: string;
  /** The person with these credentials, or undefined; takes the same time for an unknown name. */
  check(req: Request, res: Response, credentials: Credentials): Promise<Actor | undefined>;
  /** Starts a session with a new id. */
  begin(req: Request, personId: string): Promise<void>;
  end(req: Request): Promise<void>;
}

export function createGate(edges: Edges, secret: Buffer): Gate {
  const secure = isHttps(edges.config);
  const sessionCookie = secure ? '__Host-sid' : 'sid';
  const store = new SessionStore(edges);
  // An instance of our own: two servers in one process must not share strategies.
  const keeper = new passport.Passport() as unknown as passport.Authenticator;
  keeper.use(new PasswordStrategy(edges));
  keeper.serializeUser<string>((user, done) => done(null, (user as Actor).id));
  keeper.deserializeUser<string>((id, done) => done(null, findActor(edges.db, id) ?? false));
  return {
    store,
    sessionCookie,
    handlers: [
      session({
        name: sessionCookie,
        secret: secret.toString('base64'),
        store,
        genid: () => randomBytes(32).toString('base64url'),
        resave: false,
        saveUninitialized: false,
        cookie: { httpOnly: true, secure, sameSite: 'lax', path: '/' },
      }),
      keeper.initialize(),
      keeper.session(),
    ],
    check: (req, res, credentials) => check(keeper, { req, res, credentials }),
    begin: async (req, personId) => {
      await promised((done) => req.logIn({ id: personId } as Express.User, done));
      await promised((done) => req.session.save(done));
      await bookkeeping(edges, (tx) => endOldestSessions(tx, personId, MAX_SESSIONS_PER_PERSON));
    },
    end: (req) => promised((done) => req.session.destroy(done)),
  };
}

/** The signed-in person of a request. */
export function actorOf(req: Request): Actor | undefined {
  return req.user as Actor | undefined;
}

/** Whether `password` is the password of the person; hashes it anew when its parameters are old. */
export async function isPasswordOf(
  edges: Pick<Edges, 'db' | 'clock'>,
  personId: string,
  password: string,
): Promise<boolean> {
  const stored = await passwordHashOf(edges.db.read, personId);
  if (stored === undefined) return checkAgainstNobody(password);
  if (!(await isPasswordRight(stored, password))) return false;
  if (isWeakerThanNow(stored)) {
    const passwordHash = await hashPassword(password);
    const at = edges.clock().toISOString();
    await bookkeeping(edges, (tx) => storePasswordHash(tx, personId, { passwordHash, at }));
  }
  return true;
}

class PasswordStrategy extends passport.Strategy {
  override readonly name = 'password';
  // Passport works on a copy made by Object.create, which has no #private members.
  constructor(private readonly edges: Edges) {
    super();
  }

  override authenticate(_req: Request, options: { credentials: Credentials }): void {
    this.find(options.credentials).then(
      (actor) => (actor ? this.success(actor) : this.fail(401)),
      (error: unknown) => this.error(error),
    );
  }

  private async find({ email, password }: Credentials): Promise<Actor | undefined> {
    const actor = findActorByEmail(this.edges.db, email);
    if (!actor) {
      await checkAgainstNobody(password);
      return undefined;
    }
    return (await isPasswordOf(this.edges, actor.id, password)) ? actor : undefined;
  }
}

function check(
  keeper: passport.Authenticator,
  { req, res, credentials }: { req: Request; res: Response; credentials: Credentials },
): Promise<Actor | undefined> {
  return new Promise((resolve, reject) => {
    const answered = (error: unknown, user: unknown): void => {
      if (error) reject(error instanceof Error ? error : new Error(String(error)));
      else resolve((user || undefined) as Actor | undefined);
    };
    const options = { session: false, credentials } as passport.AuthenticateOptions;
    const handler = keeper.authenticate('password', options, answered) as RequestHandler;
    void handler(req, res, answered as never);
  });
}

/** A step that express-session or passport reports through a callback. */
function promised(step: (done: (error?: unknown) => void) => void): Promise<void> {
  return new Promise((resolve, reject) => {
    step((error) => {
      if (error) reject(error instanceof Error ? error : new Error(String(error)));
      else resolve();
    });
  });
}
