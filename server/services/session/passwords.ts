import { compare, hash, truncates } from 'bcryptjs';

/** 2^10 rounds: about 60 ms on the machine it was chosen on, pure JavaScript in slices that let others run. */
const cost = 10;

/** bcrypt reads 72 bytes; a longer password would silently be another, shorter one. */
export const isTooLongForBcrypt = (password: string): boolean => truncates(password);

export async function hashPassword(password: string): Promise<string> {
  return hash(password, cost);
}

/** A hash nobody has the password of, so that an unknown address takes as long to refuse as a wrong password. */
const nobodysHash = hash(crypto.randomUUID(), cost);

/** Whether the password fits; always does the whole work, also without a hash to compare with. */
export async function passwordFits(password: string, passwordHash: string | null): Promise<boolean> {
  const fits = await compare(password, passwordHash ?? (await nobodysHash));
  return fits && passwordHash !== null && !isTooLongForBcrypt(password);
}
