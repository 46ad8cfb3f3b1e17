import { ROLE_NAMES, type Membership } from '@/lib/rules/roles';

/** In words, since a disabled account must not look like a live one. */
export function accountState(person: { isDisabled: boolean; hasPassword: boolean }): string {
  if (person.isDisabled) return 'disabled';
  return person.hasPassword ? 'in use' : 'invited';
}

export function RoleList({ memberships }: { memberships: readonly Membership[] }) {
  if (memberships.length === 0) return <span className="text-grey">none</span>;
  return (
    <ul>
      {memberships.map(({ role, laboratoryId, laboratoryName }) => (
        <li key={`${role} ${laboratoryId}`}>
          {ROLE_NAMES[role]}
          {laboratoryName && <span className="text-ink-soft">, {laboratoryName}</span>}
        </li>
      ))}
    </ul>
  );
}
