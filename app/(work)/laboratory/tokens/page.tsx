import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { Table, Td, Th } from '@/components/ui/table';
import { requireOwnLaboratory } from '@/lib/auth/guards';
import { publicAddress } from '@/lib/env';
import { formatDate, formatDateTime } from '@/lib/format';
import { lastTokenDay } from '@/lib/schemas/tokens';
import { listTokens } from '@/lib/services/tokens';
import { NewTokenForm } from './new-token-form';
import { RevokeToken } from './revoke-token';

export const metadata = { title: 'Tokens' };

type Token = Awaited<ReturnType<typeof listTokens>>[number];

export default async function TokensPage() {
  const { actor, laboratory } = await requireOwnLaboratory('own:tokens');
  const tokens = await listTokens(actor);
  const now = new Date();
  return (
    <>
      <PageHeader
        title="Tokens"
        lead={`A token lets a program of ${laboratory.name} send results. It can do what an analyst can, and nothing at any other laboratory.`}
      />
      {tokens.length === 0 ? (
        <EmptyState title="No token yet">
          Tokens stand here with their last day and when they were last used. Make the first one below.
        </EmptyState>
      ) : (
        <TokenTable tokens={tokens} now={now.toISOString()} />
      )}
      <section className="flex flex-col gap-3" aria-labelledby="new-token">
        <h2 id="new-token">New token</h2>
        <NewTokenForm
          firstDay={now.toISOString().slice(0, 10)}
          lastDay={lastTokenDay(now)}
          address={publicAddress()}
        />
      </section>
    </>
  );
}

function stateOf(token: Token, now: string): string {
  if (token.revokedAt) return `revoked ${formatDate(token.revokedAt)}`;
  return token.expiresAt <= now ? 'expired' : 'in force';
}

function TokenTable({ tokens, now }: { tokens: Token[]; now: string }) {
  return (
    <Table caption="Tokens" hideCaption stacked>
      <thead>
        <tr>
          <Th>Name</Th>
          <Th>Ends in</Th>
          <Th>Made</Th>
          <Th>Last day</Th>
          <Th>Last used</Th>
          <Th>State</Th>
          <Th>
            <span className="sr-only">Revoke</span>
          </Th>
        </tr>
      </thead>
      <tbody>
        {tokens.map((token) => (
          <tr key={token.id}>
            <Th scope="row" className="min-w-32 align-top font-semibold">
              {token.name}
            </Th>
            <Td label="Ends in" className="font-mono text-sm">
              {token.lastFour}
            </Td>
            <Td label="Made" className="figures">
              {formatDate(token.createdAt)}
            </Td>
            <Td label="Last day" className="figures">
              {formatDate(token.expiresAt)}
            </Td>
            <Td label="Last used" className="figures">
              {token.lastUsedAt ? formatDateTime(token.lastUsedAt) : 'never'}
            </Td>
            <Td label="State" className="whitespace-nowrap">
              {stateOf(token, now)}
            </Td>
            <Td className="text-right">
              {stateOf(token, now) === 'in force' && <RevokeToken id={token.id} name={token.name} />}
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
