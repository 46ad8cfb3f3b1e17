import { Select } from '@/components/ui/controls';
import { LABORATORY_ROLES, ROLE_NAMES } from '@/lib/rules/roles';

interface LaboratoryRoleFieldsProps {
  laboratories: { id: number; name: string }[];
  /** Name of the field for the role. */
  roleName: string;
  values?: Record<string, string>;
  errors?: Record<string, string>;
  optional?: boolean;
}

export const LABORATORY_ROLE_OPTIONS = LABORATORY_ROLES.map((role) => ({
  value: role,
  label: ROLE_NAMES[role],
}));

/** The keys make React take a new default after a refusal; it does not do so for selects by itself. */
export function LaboratoryRoleFields(props: LaboratoryRoleFieldsProps) {
  const { laboratories, roleName, values, errors, optional } = props;
  const laboratory = values?.laboratoryId ?? '';
  const role = values?.[roleName] ?? 'analyst';
  return (
    <>
      <Select
        key={`laboratory ${laboratory}`}
        name="laboratoryId"
        label="Laboratory"
        optional={optional}
        options={laboratories.map(({ id, name }) => ({ value: String(id), label: name }))}
        placeholder={optional ? 'None' : 'Choose one'}
        defaultValue={laboratory}
        error={errors?.laboratoryId}
      />
      <Select
        key={`role ${role}`}
        name={roleName}
        label="Role at the laboratory"
        options={LABORATORY_ROLE_OPTIONS}
        defaultValue={role}
        error={errors?.[roleName]}
      />
    </>
  );
}
