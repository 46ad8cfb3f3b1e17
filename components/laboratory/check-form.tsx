import { Button } from '@/components/ui/button';
import { TextInput } from '@/components/ui/controls';

/** A plain form, so that a code can be checked without script. */
export function CheckForm({ code }: { code?: string }) {
  return (
    <form method="get" action="/check" className="flex max-w-md flex-wrap items-end gap-3">
      <TextInput
        name="code"
        label="Code of the receipt"
        hint="Such as 7QK2-0XNB-4TRM"
        defaultValue={code}
        autoComplete="off"
        autoCapitalize="characters"
        spellCheck={false}
        required
        className="min-w-48 flex-1"
      />
      <Button type="submit" variant="primary">
        Check
      </Button>
    </form>
  );
}
