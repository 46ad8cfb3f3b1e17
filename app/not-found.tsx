import { ButtonLink } from '@/components/ui/button';
import { BrandHeader } from './brand-header';
import { PageMessage } from './page-message';

export const metadata = { title: 'Not found' };

export default function NotFoundPage() {
  return (
    <>
      <BrandHeader />
      <main id="main" className="mx-auto w-full max-w-page px-4 md:px-6">
        <PageMessage title="There is no page at this address">
          <p>The address may be mistyped, or what stood here has been moved or removed.</p>
          <div>
            <ButtonLink href="/">Front page</ButtonLink>
          </div>
        </PageMessage>
      </main>
    </>
  );
}
