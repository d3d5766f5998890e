import { randomUUID } from 'node:crypto';
import jwt from 'jsonwebtoken';
import { Op } from 'sequelize';
import { signInFailed } from '../../errors';
import type { Database } from '../../models/database';
import { findAccount, type Account } from './account';
import { passwordFits } from './passwords';

/** A working day: teaching computers are shared. */
export const sessionHours = 12;
const algorithm = 'HS256';

export interface SessionDependencies {
  database: Database;
  secret: string;
  now: () => Date;
}

export interface SignedIn {
  account: Account;
  /** For the cookie. */
  token: string;
  expiresAt: Date;
}

/** Checks e-mail and password and opens a session; throws `signInFailed`, whichever of the two is wrong. */
export async function signIn(
  { database, secret, now }: SessionDependencies,
  credentials: { email: string; password: string },
): Promise<SignedIn> {
  const user = await database.users.findOne({ where: { email: credentials.email } });
  const fits = await passwordFits(credentials.password, user?.passwordHash ?? null);
  const account = user && fits ? await findAccount(database, user.id) : null;
  if (!account) throw signInFailed();
  const createdAt = now();
  const expiresAt = new Date(createdAt.getTime() + sessionHours * 3_600_000);
  const id = randomUUID();
  const row = {
    id,
    userId: account.userId,
    createdAt: createdAt.toISOString(),
    expiresAt: expiresAt.toISOString(),
  };
  await database.write(async (transaction) => {
    await database.sessions.destroy({ where: { expiresAt: { [Op.lte]: row.createdAt } }, transaction });
    await database.sessions.create(row, { transaction });
  });
  const token = jwt.sign({ sid: id }, secret, { algorithm, subject: account.userId, noTimestamp: true });
  return { account, token, expiresAt };
}

/** The session a token names; null when it was not signed by us. */
function readToken(secret: string, token: string): { sessionId: string; userId: string } | null {
  try {
    const claims = jwt.verify(token, secret, { algorithms: [algorithm] });
    if (typeof claims === 'string' || typeof claims.sid !== 'string' || !claims.sub) return null;
    return { sessionId: claims.sid, userId: claims.sub };
  } catch {
    return null;
  }
}

/** Who a token stands for; null when it is forged, or the session has ended or expired. */
export async function findSession(
  { database, secret, now }: SessionDependencies,
  token: string,
): Promise<Account | null> {
  const claims = readToken(secret, token);
  const session = claims && (await database.sessions.findByPk(claims.sessionId));
  if (!session || session.userId !== claims.userId || session.expiresAt <= now().toISOString()) return null;
  return findAccount(database, session.userId);
}

/** Ends the session of a token, for good: the token is worth nothing afterwards. Unknown ones are ignored. */
export async function signOut({ database, secret }: SessionDependencies, token: string): Promise<void> {
  const claims = readToken(secret, token);
  if (!claims) return;
  await database.write((transaction) =>
    database.sessions.destroy({ where: { id: claims.sessionId }, transaction }),
  );
}
