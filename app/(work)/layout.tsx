import { cookies } from 'next/headers';
import type { ReactNode } from 'react';
import { SiteFooter } from '@/components/ui/site-footer';
import { readTheme, THEME_COOKIE } from '@/components/ui/theme';
import { requireActor } from '@/lib/auth/guards';
import { homeOf } from '@/lib/auth/home';
import { navigationOf } from './navigation';
import { UserMenu } from './user-menu';
import { WorkHeader } from './work-header';

export default async function WorkLayout({ children }: { children: ReactNode }) {
  const actor = await requireActor();
  const theme = readTheme((await cookies()).get(THEME_COOKIE)?.value);
  return (
    <>
      <WorkHeader
        home={homeOf(actor)}
        links={navigationOf(actor)}
        right={<UserMenu actor={actor} theme={theme} />}
      />
      <main id="main" className="mx-auto flex w-full max-w-page grow flex-col gap-8 px-4 py-8 md:px-6">
        {children}
      </main>
      <SiteFooter>
        A score is not a verdict on safety. A decision on a lot follows the regulation that applies and your
        own accredited procedure.
      </SiteFooter>
    </>
  );
}
