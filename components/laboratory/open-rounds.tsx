import { Table, Td, Th } from '@/components/ui/table';
import { formatDate, formatRelativeDays } from '@/lib/format';

export interface OpenRoundDates {
  slug: string;
  name: string;
  schemeName: string;
  dispatchAt: string;
  closesAt: string;
  publishAt: string;
}

export type OpenRoundsProps = { rounds: readonly OpenRoundDates[]; now: string };

/** The dates of the rounds that are open now; who takes part is not for the public. */
export function OpenRounds({ rounds, now }: OpenRoundsProps) {
  return (
    <section aria-labelledby="open-rounds" className="flex flex-col gap-2">
      <h2 id="open-rounds">Open rounds</h2>
      {rounds.length === 0 ? (
        <p className="text-ink-soft">No round is open at the moment. The next dates will stand here.</p>
      ) : (
        <Table caption="Dates of the open rounds" hideCaption fullHeight stacked>
          <thead>
            <tr>
              <Th>Round</Th>
              <Th>Items leave</Th>
              <Th>Results due</Th>
              <Th>Scores planned</Th>
            </tr>
          </thead>
          <tbody>
            {rounds.map((round) => (
              <tr key={round.slug}>
                <Th scope="row" className="align-top">
                  <span className="font-semibold">{round.name}</span>
                  <span className="block text-sm font-normal text-ink-soft">{round.schemeName}</span>
                </Th>
                <Td label="Items leave" className="figures">
                  {formatDate(round.dispatchAt)}
                </Td>
                <Td label="Results due" className="figures">
                  {formatDate(round.closesAt)}
                  <span className="block text-sm text-ink-soft">
                    {formatRelativeDays(round.closesAt, now)}
                  </span>
                </Td>
                <Td label="Scores planned" className="figures">
                  {formatDate(round.publishAt)}
                </Td>
              </tr>
            ))}
          </tbody>
        </Table>
      )}
    </section>
  );
}
