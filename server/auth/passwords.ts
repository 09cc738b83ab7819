/** Password hashes (argon2id, with the parameters that the package recommends). */
import { hash, verify } from '@node-rs/argon2';

/** The password of the demo sign-ins; refused in production. */
export const demoPassword = 'slack-water-demo';

export function hashPassword(password: string): Promise<string> {
  return hash(password.normalize('NFKC'));
}

/** Verified against when there is no such user, so that both answers take as long. */
let decoyHash: Promise<string> | null = null;

/** Whether the password fits; always false, after the same work, when there is no hash. */
export async function checkPassword(stored: string | null, password: string): Promise<boolean> {
  decoyHash ??= hashPassword('nobody has this password');
  const fits = await verify(stored ?? (await decoyHash), password.normalize('NFKC'));
  return stored !== null && fits;
}
