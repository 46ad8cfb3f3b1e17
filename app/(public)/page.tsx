import Link from 'next/link';
import { OpenRounds } from '@/components/laboratory/open-rounds';
import { RoundSketch } from '@/components/laboratory/round-sketch';
import { ButtonLink } from '@/components/ui/button';
import { db } from '@/db/connection';
import { listOpenRounds } from '@/db/views/round-list-view';
import { homeOf } from '@/lib/auth/home';
import { currentActor } from '@/lib/auth/session';

export default async function FrontPage() {
  const now = new Date().toISOString();
  const [actor, rounds] = await Promise.all([currentActor(), listOpenRounds(db(), now)]);
  return (
    <>
      <div className="flex flex-wrap items-center justify-between gap-x-16 gap-y-8 pt-4">
        <header className="flex max-w-measure flex-1 basis-96 flex-col gap-4">
          <h1>The same grain, measured blind in many laboratories</h1>
          <p className="report-text text-lg">
            A truck of maize is accepted or turned away on one figure. Assize is where laboratories learn how
            far their figure is from the right one: a provider sends out the same material, every laboratory
            reports under a code, and each is told where it stands, round after round.
          </p>
          <div className="flex flex-wrap gap-2">
            {actor ? (
              <ButtonLink href={homeOf(actor)} variant="primary">
                Go on to your work, {actor.name}
              </ButtonLink>
            ) : (
              <ButtonLink href="/sign-in" variant="primary">
                Sign in
              </ButtonLink>
            )}
            <ButtonLink href="/check">Check a receipt</ButtonLink>
          </div>
        </header>
        <div className="w-full max-w-md">
          <RoundSketch />
        </div>
      </div>
      <OpenRounds rounds={rounds} now={now} />
      <div className="grid gap-x-12 gap-y-8 border-t pt-6 md:grid-cols-2">
        <ForLaboratories />
        <ForProviders />
      </div>
      <section aria-labelledby="figures" className="border-t pt-6">
        <h2 id="figures">Figures that can be redone by hand</h2>
        <p className="report-text mt-2">
          Assigned values, their uncertainty and every score follow ISO 13528, and each figure opens its
          working: the formula, the clause, the numbers that went in. What a laboratory wrote is kept to the
          letter, with a receipt that{' '}
          <Link href="/check" className="text-link">
            anyone who holds its code can check
          </Link>
          .
        </p>
        <p className="report-text mt-3 text-ink-soft">
          A score is not a verdict on safety. A decision on a lot follows the regulation that applies and the
          laboratory&rsquo;s accredited procedure.
        </p>
      </section>
    </>
  );
}

function ForLaboratories() {
  return (
    <Part title="For a laboratory">
      <li className="border-b py-1.5">See what is due: items to receive, results to send, scores to read.</li>
      <li className="border-b py-1.5">
        Drop a CSV file as your system writes it, and see how every row was read before it counts.
      </li>
      <li className="border-b py-1.5">Find your own bar among all codes, and your scores over the years.</li>
      <li className="border-b py-1.5">Know what to look at first when there is a signal.</li>
    </Part>
  );
}

function ForProviders() {
  return (
    <Part title="For a provider">
      <li className="border-b py-1.5">
        Plan a scheme and its rounds, enrol laboratories, give out random codes.
      </li>
      <li className="border-b py-1.5">
        Watch results come in, and close, evaluate and sign off with a second pair of eyes.
      </li>
      <li className="border-b py-1.5">Use estimates that a few bad results cannot spoil.</li>
      <li className="border-b py-1.5">Publish once, with a record of who did what.</li>
    </Part>
  );
}

function Part({ title, children }: { title: string; children: React.ReactNode }) {
  return (
    <section>
      <h2>{title}</h2>
      <ul className="mt-2 flex flex-col">{children}</ul>
    </section>
  );
}
