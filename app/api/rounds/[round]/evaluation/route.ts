import { addRefusal } from '@/lib/auth/refusals';
import { actorFromRequest } from '@/lib/auth/request';
import { AppError } from '@/lib/errors';
import { handle } from '@/lib/http';
import { getVisibleEvaluation } from '@/lib/services/read-evaluation';

type Context = RouteContext<'/api/rounds/[round]/evaluation'>;

/** The newest evaluation as JSON: to the provider's staff, and to participants once it is published. */
export const GET = handle(async (request: Request, { params }: Context) => {
  const actor = await actorFromRequest(request);
  if (!actor) throw new AppError('not-signed-in', 'Sign in first, or send a token.');
  const { round: slug } = await params;
  const { round, evaluation, signOffs, measurands, ownCodes } = await addRefusal(
    actor,
    `evaluation of ${slug}`,
    () => getVisibleEvaluation(actor, slug),
  );
  const { version, libraryVersion, inputsSha256, createdAt } = evaluation;
  return Response.json({
    round: { slug: round.slug, name: round.name, state: round.state, publishedAt: round.publishedAt },
    version,
    libraryVersion,
    inputsSha256,
    createdAt,
    signedAt: signOffs.findLast((entry) => entry.decision === 'signed')?.at ?? null,
    ownCodes,
    measurands: measurands.map(({ plan, evaluation: body }) => ({
      item: plan.itemCode,
      measurand: plan.code,
      name: plan.name,
      unit: plan.unit,
      decimals: plan.decimals,
      ...body,
    })),
  });
});
