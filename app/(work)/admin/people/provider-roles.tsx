import { Checkbox } from '@/components/ui/controls';
import { FieldError } from '@/components/ui/field';
import { PROVIDER_ROLES, ROLE_NAMES, type ProviderRole } from '@/lib/rules/roles';

const HINTS: Record<ProviderRole, string> = {
  administrator: 'people, mail and the log',
  coordinator: 'schemes and rounds',
  reviewer: 'signs what others prepared',
};

export function ProviderRoles({ checked, error }: { checked: readonly string[]; error?: string }) {
  return (
    <fieldset className="flex flex-col gap-2">
      <legend className="mb-1 font-semibold">Roles at the provider</legend>
      {PROVIDER_ROLES.map((role) => (
        <Checkbox
          key={`${role} ${checked.includes(role)}`}
          name="providerRoles[]"
          value={role}
          label={`${ROLE_NAMES[role]}: ${HINTS[role]}`}
          defaultChecked={checked.includes(role)}
        />
      ))}
      <FieldError id="provider-roles" error={error} />
    </fieldset>
  );
}
