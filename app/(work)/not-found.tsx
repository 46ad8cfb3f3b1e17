import { ButtonLink } from '@/components/ui/button';
import { homeOf } from '@/lib/auth/home';
import { currentActor } from '@/lib/auth/session';
import { PageMessage } from '../page-message';

export const metadata = { title: 'Not found' };

export default async function WorkNotFoundPage() {
  const actor = await currentActor();
  return (
    <PageMessage title="Nothing here for you">
      <p>
        This address does not exist, or it is not yours to see. The log keeps a note when a role was missing.
      </p>
      <div>
        <ButtonLink href={actor ? homeOf(actor) : '/'}>To your work</ButtonLink>
      </div>
    </PageMessage>
  );
}
