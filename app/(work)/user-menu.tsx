import Link from 'next/link';
import { Button } from '@/components/ui/button';
import type { Theme } from '@/components/ui/theme';
import { ThemeSwitch } from '@/components/ui/theme-switch';
import { laboratoriesOf } from '@/lib/rules/permissions';
import { ROLE_NAMES, type Actor } from '@/lib/rules/roles';
import { signOutAction } from './account/actions';
import { DropDown } from './drop-down';
import { LaboratorySwitcher } from './laboratory-switcher';

interface UserMenuProps {
  actor: Actor;
  theme: Theme;
}

/** A panel on wide screens; inside the menu of small ones its content just stands there. */
export function UserMenu({ actor, theme }: UserMenuProps) {
  const laboratory = laboratoriesOf(actor).find((entry) => entry.id === actor.laboratoryId);
  const content = <UserMenuContent actor={actor} theme={theme} />;
  return (
    <>
      <div className="hidden md:block">
        <DropDown label={laboratory ? `${laboratory.name}` : actor.name}>{content}</DropDown>
      </div>
      <div className="w-full md:hidden">{content}</div>
    </>
  );
}

function UserMenuContent({ actor, theme }: UserMenuProps) {
  const laboratories = laboratoriesOf(actor);
  return (
    <div className="flex flex-col gap-3">
      <div className="min-w-0">
        <p className="font-semibold wrap-anywhere">{actor.name}</p>
        <p className="text-sm text-ink-soft wrap-anywhere">{actor.email}</p>
        <p className="text-sm text-ink-soft">{rolesInWords(actor)}</p>
      </div>
      {laboratories.length > 1 && (
        <LaboratorySwitcher laboratories={laboratories} chosenId={actor.laboratoryId} />
      )}
      <div className="flex flex-wrap items-center justify-between gap-3 border-t pt-3">
        <Link href="/account" className="text-link inline-flex min-h-6 items-center">
          Account
        </Link>
        <ThemeSwitch initial={theme} />
        <form action={signOutAction}>
          <Button type="submit" size="small">
            Sign out
          </Button>
        </form>
      </div>
    </div>
  );
}

/** Roles at the provider and at the laboratory chosen now. */
function rolesInWords(actor: Actor): string {
  const here = actor.memberships.filter(
    ({ laboratoryId }) => laboratoryId === null || laboratoryId === actor.laboratoryId,
  );
  return [...new Set(here.map(({ role }) => ROLE_NAMES[role]))].join(', ') || 'No role yet';
}
