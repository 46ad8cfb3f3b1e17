import { randomBytes } from 'node:crypto';
import type { Db } from '@/db/connection';
import type { Role } from '@/lib/rules/roles';
import { hashPassword } from '@/lib/services/password-hash';

/** A person with one role, who can sign in. */
export async function makePerson(
  connection: Db,
  role: Role,
  laboratoryId: number | null = null,
): Promise<{ id: number; email: string; password: string }> {
  const email = `${role.replace('_', '-')}-${randomBytes(4).toString('hex')}@fixture.example`;
  const password = randomBytes(12).toString('hex');
  const at = new Date().toISOString();
  const [user] = await connection('users')
    .insert({ email, name: `Fixture ${role}`, password_hash: await hashPassword(password), created_at: at })
    .returning('id');
  await connection('memberships').insert({
    user_id: user.id,
    laboratory_id: laboratoryId,
    role,
    created_at: at,
  });
  return { id: user.id, email, password };
}
