import type { Knex } from 'knex';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import * as account from '@/app/(work)/account/actions';
import * as mail from '@/app/(work)/admin/mail/actions';
import * as people from '@/app/(work)/admin/people/actions';
import * as laboratories from '@/app/(work)/laboratories/actions';
import * as colleagues from '@/app/(work)/laboratory/people/actions';
import * as tokens from '@/app/(work)/laboratory/tokens/actions';
import type { ActionResult } from '@/lib/action-form';
import { sealSessionId, sessionCookieName } from '@/lib/auth/cookie';
import { LABORATORY_ROLES, type Role } from '@/lib/rules/roles';
import { testDatabase } from '../../db/test-database';
import { actorOf, addLaboratory, addPerson, logOf } from '../people-fixture';

const browser = vi.hoisted(() => ({ cookie: '' }));
vi.mock('next/cache', () => ({ revalidatePath: () => undefined }));
vi.mock('next/headers', () => ({
  headers: async () => new Headers({ 'x-assize-path': '/here' }),
  cookies: async () => ({ get: () => ({ value: browser.cookie }), set: () => undefined }),
}));

type Action = (state: null, form: FormData) => Promise<ActionResult<unknown>>;

const ROLES: Role[] = ['administrator', 'coordinator', 'reviewer', 'lab_manager', 'analyst'];

/** Who may send each form; an empty form gets past the rules to the complaints about its fields, or it does not. */
const ACTIONS: [string, Action, Role[]][] = [
  ['invite a person', people.invitePersonAction as Action, ['administrator']],
  ['change a person', people.changePersonAction as Action, ['administrator']],
  ['give a role', people.giveLaboratoryRoleAction as Action, ['administrator']],
  ['take a role', people.takeLaboratoryRoleAction as Action, ['administrator']],
  ['disable a person', people.disablePersonAction as Action, ['administrator']],
  ['enable a person', people.enablePersonAction as Action, ['administrator']],
  ['send a link', people.sendLinkAction as Action, ['administrator']],
  ['send mail again', mail.sendMailAgainAction as Action, ['administrator']],
  ['add a laboratory', laboratories.addLaboratoryAction as Action, ['administrator', 'coordinator']],
  ['change a laboratory', laboratories.changeLaboratoryAction as Action, ['administrator', 'coordinator']],
  ['invite a colleague', colleagues.inviteColleagueAction as Action, ['lab_manager']],
  ['remove a colleague', colleagues.removeColleagueAction as Action, ['lab_manager']],
  ['invite a colleague again', colleagues.inviteAgainAction as Action, ['lab_manager']],
  ['make a token', tokens.addTokenAction as Action, ['lab_manager']],
  ['revoke a token', tokens.revokeTokenAction as Action, ['lab_manager']],
  ['change the own password', account.changePasswordAction as Action, ROLES],
];

let db: Knex;
let mill: number;

beforeEach(async () => {
  db = await testDatabase();
  mill = await addLaboratory(db, 'Lower Mill');
});

async function signInAs(role: Role): Promise<void> {
  const isLaboratory = (LABORATORY_ROLES as readonly Role[]).includes(role);
  const userId = await addPerson(db, { name: 'Some One', roles: [isLaboratory ? [role, mill] : role] });
  const { sessionId } = await actorOf(db, userId);
  browser.cookie = await sealSessionId(sessionId);
}

describe.each(ACTIONS)('to %s', (_name, action, allowed) => {
  it.each(ROLES)('as %s', async (role) => {
    await signInAs(role);
    const result = await action(null, new FormData());
    expect(result.ok).toBe(false);
    if (result.ok) return;
    const refusals = (await logOf(db)).filter((row) => row.outcome === 'refused');
    if (allowed.includes(role)) {
      expect(Object.keys(result.fieldErrors ?? {})).not.toHaveLength(0);
      expect(refusals).toEqual([]);
    } else {
      expect(result.fieldErrors).toBeUndefined();
      expect(result.formError).toMatch(/do not allow|not yours to see/);
      expect(refusals).toHaveLength(1);
    }
  });

  it('without signing in leads to the sign-in page', async () => {
    browser.cookie = '';
    await expect(action(null, new FormData())).rejects.toMatchObject({
      digest: expect.stringContaining('/sign-in?from=%2Fhere'),
    });
  });
});

describe('a form that was refused', () => {
  it('comes back as typed, without any password', async () => {
    await signInAs('administrator');
    const form = new FormData();
    form.set('name', 'Cy Reed');
    form.set('email', 'not an address');
    form.append('providerRoles[]', 'reviewer');
    form.append('providerRoles[]', 'coordinator');
    form.set('password', 'grain dust and rivers');
    form.set('$ACTION_ID_1', 'x');
    expect(await (people.invitePersonAction as Action)(null, form)).toEqual({
      ok: false,
      formError: 'Nothing was saved. Look at the marked fields.',
      fieldErrors: { email: 'Enter an e-mail address such as name@laboratory.example.' },
      values: { name: 'Cy Reed', email: 'not an address', providerRoles: 'reviewer,coordinator' },
    });
  });

  it('says why in the words of the service', async () => {
    await signInAs('administrator');
    const form = new FormData();
    form.set('userId', '1');
    expect(await people.disablePersonAction(null, form)).toMatchObject({
      ok: false,
      formError: expect.stringContaining('last administrator'),
    });
  });

  it('shows a fault as one sentence with a number', async () => {
    await signInAs('administrator');
    await db.raw('alter table users rename column is_disabled to was_disabled');
    await db.raw('alter table users add column is_disabled integer not null default 0');
    await db.raw(
      'create trigger broken before update on users begin select raise(abort, "secret words"); end',
    );
    const form = new FormData();
    form.set('userId', String(await addPerson(db, { name: 'Bo Miller' })));
    const result = await people.disablePersonAction(null, form);
    expect(result).toMatchObject({
      ok: false,
      formError: expect.stringMatching(/the number [0-9a-f]{8}\.$/),
    });
    expect(JSON.stringify(result)).not.toContain('secret words');
  });
});

it('reads the cookie of the name the site uses', () => {
  expect(sessionCookieName()).toBe('next-auth.session-token');
});
