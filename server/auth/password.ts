import { hash, verify } from "@node-rs/argon2";

export interface HashCost {
  /** KiB. */
  memoryCost: number;
  timeCost: number;
  parallelism: number;
}

/** Argon2id (the library's default) at the cost that OWASP's password storage sheet asks for. */
export const usualHashCost: HashCost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** How a hash made at this cost begins. */
const preambleOf = ({ memoryCost, timeCost, parallelism }: HashCost) =>
  `$argon2id$v=19$m=${memoryCost},t=${timeCost},p=${parallelism}$`;

/** Hashes passwords and checks them, at one cost. */
export function createPasswords(cost: HashCost) {
  const hashPassword = (password: string) => hash(password, cost);
  const nobodysHash = hashPassword("nobody has this account");

  /** An account that is not there (`null`) costs the same work as a wrong password. */
  async function passwordMatches(stored: string | null, password: string): Promise<boolean> {
    const matches = await verify(stored ?? (await nobodysHash), password);
    return stored !== null && matches;
  }

  /** Whether it was made at another cost: to be made anew when its password is next known. */
  const isOutdated = (stored: string) => !stored.startsWith(preambleOf(cost));

  return { hashPassword, passwordMatches, isOutdated };
}

export type Passwords = ReturnType<typeof createPasswords>;
