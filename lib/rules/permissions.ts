import type { Actor, Role } from './roles';

/** Roles that may do each thing. A laboratory role counts only for the laboratory it is held at. */
const ALLOWED = {
  'scheme:view': ['administrator', 'coordinator', 'reviewer'],
  'scheme:edit': ['coordinator'],
  'round:view': ['administrator', 'coordinator', 'reviewer'],
  'round:edit': ['coordinator'],
  'round:open': ['coordinator'],
  'round:close': ['coordinator'],
  'round:evaluate': ['coordinator'],
  'round:sign': ['reviewer'],
  'round:publish': ['coordinator'],
  'round:cancel': ['coordinator'],
  'round:load-results': ['coordinator'],
  'round:see-results': ['administrator', 'coordinator', 'reviewer'],
  'round:see-key': ['coordinator', 'reviewer'],
  'round:see-log': ['administrator', 'coordinator', 'reviewer'],
  'enrolment:edit': ['coordinator'],
  'laboratory:list': ['administrator', 'coordinator', 'reviewer'],
  'laboratory:edit': ['administrator', 'coordinator'],
  'own:view': ['lab_manager', 'analyst'],
  'own:receive': ['lab_manager', 'analyst'],
  'own:submit': ['lab_manager', 'analyst'],
  'own:enrol': ['lab_manager'],
  'own:people': ['lab_manager'],
  'own:tokens': ['lab_manager'],
  'people:edit': ['administrator'],
  'mail:view': ['administrator'],
  'log:view': ['administrator'],
} as const satisfies Record<string, readonly Role[]>;

export type Permission = keyof typeof ALLOWED;

export const PERMISSIONS = Object.keys(ALLOWED) as Permission[];

export interface Subject {
  /** The laboratory whose rows are touched; needed by every permission that begins with `own:`. */
  laboratoryId?: number | null;
  /** The people who prepared what is to be signed: they may not sign it. */
  preparedBy?: readonly (number | null)[];
}

/** The one place that decides who may do what. */
export function can(actor: Actor | null, permission: Permission, subject: Subject = {}): boolean {
  if (!actor) return false;
  const roles: readonly Role[] = ALLOWED[permission];
  const isOwn = permission.startsWith('own:');
  if (isOwn && (subject.laboratoryId ?? null) === null) return false;
  const held = actor.memberships.some(
    (membership) =>
      roles.includes(membership.role) && (!isOwn || membership.laboratoryId === subject.laboratoryId),
  );
  if (!held) return false;
  if (permission === 'round:sign') return !(subject.preparedBy ?? []).includes(actor.userId);
  return true;
}

export function isProviderStaff(actor: Actor): boolean {
  return actor.memberships.some((membership) => membership.laboratoryId === null);
}

export function laboratoriesOf(actor: Actor): { id: number; name: string }[] {
  const found = new Map<number, string>();
  for (const { laboratoryId, laboratoryName } of actor.memberships) {
    if (laboratoryId !== null) found.set(laboratoryId, laboratoryName ?? '');
  }
  return [...found].map(([id, name]) => ({ id, name }));
}
