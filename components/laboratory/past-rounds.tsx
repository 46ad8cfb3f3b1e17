import Link from 'next/link';
import { StateTag } from '@/components/ui/state-tag';
import { Table, Td, Th } from '@/components/ui/table';
import { formatDate } from '@/lib/format';
import type { RoundState } from '@/lib/rules/round-states';
import { SignalTally, type Tally } from './signal-tally';

export interface PastRound {
  slug: string;
  name: string;
  schemeName: string;
  state: RoundState;
  closesAt: string;
  publishedAt: string | null;
  enrolmentState: 'invited' | 'enrolled' | 'declined' | 'withdrawn';
  signals: Tally;
}

export function PastRounds({ rounds }: { rounds: readonly PastRound[] }) {
  if (rounds.length === 0) return null;
  return (
    <section aria-labelledby="past" className="flex flex-col gap-3">
      <div className="flex flex-wrap items-baseline justify-between gap-x-6">
        <h2 id="past">Past rounds</h2>
        <Link href="/laboratory/trend" className="text-link inline-flex min-h-6 items-center">
          Results over time
        </Link>
      </div>
      <Table caption="Past rounds and your scores" hideCaption stacked fullHeight>
        <thead>
          <tr>
            <Th>Round</Th>
            <Th>Results due</Th>
            <Th>State</Th>
            <Th>Your scores</Th>
          </tr>
        </thead>
        <tbody>
          {rounds.map((round) => (
            <tr key={round.slug}>
              <Th scope="row" className="align-top">
                <Link
                  href={`/laboratory/rounds/${round.slug}`}
                  className="text-link inline-flex min-h-6 items-center font-semibold"
                >
                  {round.name}
                </Link>
                <span className="block text-sm font-normal text-ink-soft">{round.schemeName}</span>
              </Th>
              <Td label="Results due" className="figures">
                {formatDate(round.closesAt)}
              </Td>
              <Td label="State" className={round.state === 'published' ? 'max-sm:hidden!' : undefined}>
                {round.enrolmentState === 'enrolled' ? (
                  <StateTag of="round" state={round.state} />
                ) : (
                  <StateTag of="enrolment" state={round.enrolmentState} />
                )}
              </Td>
              <Td label="Your scores">
                {round.state === 'published' ? <SignalTally signals={round.signals} /> : '\u2013'}
              </Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </section>
  );
}
