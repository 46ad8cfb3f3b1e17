import 'server-only';
import { hash, verify } from '@node-rs/argon2';

// argon2id is the package's default kind; the costs are the first choice of the OWASP password storage cheat sheet
// (19 MiB, 2 passes, 1 lane; from memory).
const COSTS = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

let decoy: Promise<string> | null = null;

/** The same characters typed on another keyboard give the same bytes. */
function bytesOf(password: string): string {
  return password.normalize('NFKC');
}

export async function hashPassword(password: string): Promise<string> {
  return hash(bytesOf(password), COSTS);
}

/** Takes about the same time when there is no hash, so that the time does not tell which addresses have an account. */
export async function isPassword(passwordHash: string | null, password: string): Promise<boolean> {
  decoy ??= hashPassword('a password that no one has');
  const isRight = await verify(passwordHash ?? (await decoy), bytesOf(password));
  return passwordHash !== null && isRight;
}
