import Link from 'next/link';
import { StateTag } from '@/components/ui/state-tag';
import { Table, Td, Th } from '@/components/ui/table';
import { formatDate } from '@/lib/format';
import type { RoundState } from '@/lib/rules/round-states';

export interface RoundRow {
  slug: string;
  name: string;
  schemeName: string;
  schemeSlug: string;
  state: RoundState;
  opensAt: string;
  closesAt: string;
  publishAt: string;
  publishedAt: string | null;
  participantCount: number;
  submittedCount: number;
}

export type RoundTableProps = {
  caption: string;
  hideCaption?: boolean;
  rounds: RoundRow[];
  hideScheme?: boolean;
};

export function RoundTable({ caption, hideCaption = true, rounds, hideScheme }: RoundTableProps) {
  return (
    <Table caption={caption} hideCaption={hideCaption} fullHeight stacked className="md:table-fixed">
      <thead>
        <tr>
          <Th className="md:w-1/5">Round</Th>
          {!hideScheme && <Th className="max-md:hidden! md:w-1/4">Scheme</Th>}
          <Th className="md:w-1/5">State</Th>
          <Th>Results due</Th>
          <Th>Publication</Th>
          <Th numeric>Results sent</Th>
        </tr>
      </thead>
      <tbody>
        {rounds.map((round) => (
          <tr key={round.slug}>
            <Th scope="row">
              <Link href={`/rounds/${round.slug}`} className="text-link font-semibold">
                {round.name}
              </Link>
              {!hideScheme && (
                <span className="block text-sm text-ink-soft md:hidden">{round.schemeName}</span>
              )}
            </Th>
            {!hideScheme && (
              <Td className="max-md:hidden!">
                <Link href={`/schemes/${round.schemeSlug}`} className="text-link">
                  {round.schemeName}
                </Link>
              </Td>
            )}
            <Td label="State">
              <StateTag of="round" state={round.state} />
            </Td>
            <Td label="Results due" className="figures">
              {formatDate(round.closesAt)}
            </Td>
            <Td label="Publication" className="figures">
              {formatDate(round.publishedAt ?? round.publishAt)}
            </Td>
            <Td label="Results sent" numeric className="figures">
              {round.submittedCount} of {round.participantCount}
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
