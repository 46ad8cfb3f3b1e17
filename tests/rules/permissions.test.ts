import { describe, expect, it } from 'vitest';
import { can, PERMISSIONS, type Permission } from '@/lib/rules/permissions';
import {
  LABORATORY_ROLES,
  PROVIDER_ROLES,
  type Actor,
  type LaboratoryRole,
  type Membership,
  type Role,
} from '@/lib/rules/roles';

/**
 * Written by hand from what each role is for, not from the code. One letter a role, a dash where it may not:
 * a administrator, c coordinator, r reviewer, m laboratory manager, n analyst. For `own:` permissions the letters
 * count for the laboratory where the role is held.
 */
const EXPECTED: Record<Permission, string> = {
  'scheme:view': 'acr--',
  'scheme:edit': '-c---',
  'round:view': 'acr--',
  'round:edit': '-c---',
  'round:open': '-c---',
  'round:close': '-c---',
  'round:evaluate': '-c---',
  'round:sign': '--r--',
  'round:publish': '-c---',
  'round:cancel': '-c---',
  'round:load-results': '-c---',
  'round:see-results': 'acr--',
  'round:see-key': '-cr--',
  'round:see-log': 'acr--',
  'enrolment:edit': '-c---',
  'laboratory:list': 'acr--',
  'laboratory:edit': 'ac---',
  'own:view': '---mn',
  'own:receive': '---mn',
  'own:submit': '---mn',
  'own:enrol': '---m-',
  'own:people': '---m-',
  'own:tokens': '---m-',
  'people:edit': 'a----',
  'mail:view': 'a----',
  'log:view': 'a----',
};

const LETTERS: [Role, string][] = [
  ['administrator', 'a'],
  ['coordinator', 'c'],
  ['reviewer', 'r'],
  ['lab_manager', 'm'],
  ['analyst', 'n'],
];

const OWN = 7;
const OTHER = 8;
const USER = 1;

function membership(role: Role, laboratoryId = OWN): Membership {
  const isProvider = (PROVIDER_ROLES as readonly Role[]).includes(role);
  return { role, laboratoryId: isProvider ? null : laboratoryId, laboratoryName: isProvider ? null : 'Mill' };
}

function actorWith(memberships: Membership[]): Actor {
  return {
    userId: USER,
    apiTokenId: null,
    name: 'Ada Brook',
    email: 'ada@provider.example',
    memberships,
    laboratoryId: memberships[0]?.laboratoryId ?? null,
  };
}

describe('the table of roles and permissions', () => {
  it('covers every permission there is, and no other', () => {
    expect(Object.keys(EXPECTED).sort()).toEqual([...PERMISSIONS].sort());
  });

  for (const permission of Object.keys(EXPECTED) as Permission[]) {
    for (const [role, letter] of LETTERS) {
      const isListed = EXPECTED[permission].includes(letter);
      const isOwn = permission.startsWith('own:');
      const actor = actorWith([membership(role)]);

      it(`${role} ${isListed ? 'may' : 'may not'} ${permission}${isOwn ? ' at the own laboratory' : ''}`, () => {
        expect(can(actor, permission, { laboratoryId: OWN })).toBe(isListed);
      });
      it(`${role} ${isListed && !isOwn ? 'may' : 'may not'} ${permission} where another laboratory is concerned`, () => {
        expect(can(actor, permission, { laboratoryId: OTHER })).toBe(isListed && !isOwn);
      });
      it(`${role} ${isListed && !isOwn ? 'may' : 'may not'} ${permission} where no laboratory is named`, () => {
        expect(can(actor, permission)).toBe(isListed && !isOwn);
        expect(can(actor, permission, { laboratoryId: null })).toBe(isListed && !isOwn);
      });
    }
  }
});

describe('people without a role', () => {
  it.each(Object.keys(EXPECTED) as Permission[])('may not %s', (permission) => {
    expect(can(null, permission, { laboratoryId: OWN })).toBe(false);
    expect(can(actorWith([]), permission, { laboratoryId: OWN })).toBe(false);
  });
});

describe('roles at several laboratories', () => {
  const actor = actorWith([membership('lab_manager', OWN), membership('analyst', OTHER)]);

  it('count each for its own place', () => {
    expect(can(actor, 'own:people', { laboratoryId: OWN })).toBe(true);
    expect(can(actor, 'own:people', { laboratoryId: OTHER })).toBe(false);
    expect(can(actor, 'own:submit', { laboratoryId: OTHER })).toBe(true);
    expect(can(actor, 'own:submit', { laboratoryId: 99 })).toBe(false);
  });
});

describe('signing', () => {
  const reviewer = actorWith([membership('reviewer')]);
  const both = actorWith([membership('coordinator'), membership('reviewer')]);

  it('is for a reviewer who did not prepare it', () => {
    expect(can(reviewer, 'round:sign', { preparedBy: [2, 3] })).toBe(true);
    expect(can(reviewer, 'round:sign', { preparedBy: [null] })).toBe(true);
    expect(can(reviewer, 'round:sign', { preparedBy: [] })).toBe(true);
  });

  it('is refused to whoever prepared it, alone or with others', () => {
    expect(can(reviewer, 'round:sign', { preparedBy: [USER] })).toBe(false);
    expect(can(both, 'round:sign', { preparedBy: [2, USER] })).toBe(false);
    expect(can(both, 'round:sign', { preparedBy: [2] })).toBe(true);
  });

  it('is refused to every other role, whoever prepared it', () => {
    for (const role of ['administrator', 'coordinator', ...LABORATORY_ROLES] as const) {
      expect(can(actorWith([membership(role)]), 'round:sign', { preparedBy: [2] })).toBe(false);
    }
  });
});

describe('a token', () => {
  const role: LaboratoryRole = 'analyst';
  const token: Actor = { ...actorWith([membership(role)]), userId: null, apiTokenId: 5 };

  it('does what an analyst of its laboratory does, and nothing elsewhere', () => {
    const allowed = PERMISSIONS.filter((permission) => can(token, permission, { laboratoryId: OWN }));
    expect(allowed).toEqual(['own:view', 'own:receive', 'own:submit']);
    expect(PERMISSIONS.filter((permission) => can(token, permission, { laboratoryId: OTHER }))).toEqual([]);
  });
});
