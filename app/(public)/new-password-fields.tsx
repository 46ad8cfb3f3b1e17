import { TextInput } from '@/components/ui/controls';
import { PASSWORD_HINT } from '@/lib/schemas/sign-in';

/** The new password, twice; the e-mail goes along so that a password manager keeps both. */
export function NewPasswordFields({ email, errors }: { email?: string; errors?: Record<string, string> }) {
  return (
    <>
      {email !== undefined && (
        <input type="text" name="username" value={email} readOnly hidden autoComplete="username" />
      )}
      <TextInput
        name="password"
        type="password"
        label="New password"
        hint={PASSWORD_HINT}
        autoComplete="new-password"
        required
        error={errors?.password}
      />
      <TextInput
        name="passwordAgain"
        type="password"
        label="The same password again"
        autoComplete="new-password"
        required
        error={errors?.passwordAgain}
      />
    </>
  );
}
