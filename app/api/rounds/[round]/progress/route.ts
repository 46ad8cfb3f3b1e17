import { authorise } from '@/lib/auth/authorise';
import { actorFromRequest } from '@/lib/auth/request';
import { handle } from '@/lib/http';
import { getRoundProgress } from '@/lib/services/round-progress';

type Context = RouteContext<'/api/rounds/[round]/progress'>;

/** How many laboratories have sent results; the page of participants asks for it while a round is open. */
export const GET = handle(async (request: Request, { params }: Context) => {
  await authorise(await actorFromRequest(request), 'round:view', {}, { hiddenAs: 'The round' });
  const { round } = await params;
  return Response.json(await getRoundProgress(round));
});
