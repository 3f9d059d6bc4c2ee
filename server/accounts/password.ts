// Passwords: argon2id at rest, checked through passport's local strategy, the same time for known and unknown addresses.
import { hash, verify } from '@node-rs/argon2';
import { and, isNull, sql } from 'drizzle-orm';
import { Passport } from 'passport';
import { Strategy as LocalStrategy } from 'passport-local';
import type { Deps } from '../deps';
import { users } from './tables';

/** argon2id with the library's defaults: 19 MiB, 2 passes, 1 lane (OWASP's recommendation). */
export const hashPassword = (password: string): Promise<string> => hash(password);

/** Compared against where there is no such account, so that the answer takes as long. */
const NOBODY = hash('nobody has this password');

async function findByPassword(deps: Deps, email: string, password: string): Promise<string | null> {
  const [user] = await deps.db
    .select({ id: users.id, passwordHash: users.passwordHash })
    .from(users)
    .where(and(sql`lower(${users.email}) = lower(${email})`, isNull(users.closedAt)));
  const matches = await verify(user?.passwordHash ?? (await NOBODY), password);
  return user && matches ? user.id : null;
}

/** @returns the user's id, or null for a wrong address or password */
export async function checkPassword(deps: Deps, email: string, password: string): Promise<string | null> {
  const passport = new Passport();
  passport.use(
    new LocalStrategy(
      { usernameField: 'email', passwordField: 'password', session: false },
      (address, secret, done) => {
        findByPassword(deps, address, secret).then(
          (userId) => done(null, userId === null ? false : { userId }),
          (error: unknown) => done(error),
        );
      },
    ),
  );
  return new Promise((resolve, reject) => {
    const authenticate: unknown = passport.authenticate(
      'local',
      { session: false },
      (error: unknown, user: unknown) => {
        if (error instanceof Error) return reject(error);
        resolve(typeof user === 'object' && user !== null && 'userId' in user ? String(user.userId) : null);
      },
    );
    if (typeof authenticate !== 'function') throw new Error('passport gave no middleware');
    authenticate({ body: { email, password }, query: {} }, {}, reject);
  });
}
