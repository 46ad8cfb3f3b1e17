import { cookies, headers } from 'next/headers';
import { redirect } from 'next/navigation';
import type { ReactNode } from 'react';
import { ButtonLink } from '@/components/ui/button';
import { SiteFooter } from '@/components/ui/site-footer';
import { SiteHeader } from '@/components/ui/site-header';
import { readTheme, THEME_COOKIE } from '@/components/ui/theme';
import { ThemeSwitch } from '@/components/ui/theme-switch';
import { homeOf } from '@/lib/auth/home';
import { PATH_HEADER } from '@/lib/auth/local-path';
import { currentActor } from '@/lib/auth/session';
import { isSetUpOpen } from '@/lib/services/set-up';

const SET_UP = '/set-up';

export default async function PublicLayout({ children }: { children: ReactNode }) {
  const path = (await headers()).get(PATH_HEADER)?.split('?')[0];
  if (path !== SET_UP && (await isSetUpOpen())) redirect(SET_UP);
  const actor = await currentActor();
  const theme = readTheme((await cookies()).get(THEME_COOKIE)?.value);
  const way = actor ? { href: homeOf(actor), label: 'To your work' } : { href: '/sign-in', label: 'Sign in' };
  const right = (
    <>
      <ThemeSwitch initial={theme} />
      {path !== way.href && path !== SET_UP && <ButtonLink href={way.href}>{way.label}</ButtonLink>}
    </>
  );
  return (
    <>
      <SiteHeader links={[]} right={right} />
      <main id="main" className="mx-auto flex w-full max-w-page grow flex-col gap-8 px-4 py-8 md:px-6">
        {children}
      </main>
      <SiteFooter>
        Proficiency rounds and method comparison for grain, feed and food safety testing.
      </SiteFooter>
    </>
  );
}
