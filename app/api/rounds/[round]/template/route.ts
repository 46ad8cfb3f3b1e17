import { authorise } from '@/lib/auth/authorise';
import { addRefusal } from '@/lib/auth/refusals';
import { actorFromRequest } from '@/lib/auth/request';
import { handle } from '@/lib/http';
import { laboratoryTemplate, roundTemplate } from '@/lib/services/results-template';

type Context = RouteContext<'/api/rounds/[round]/template'>;

/** A CSV to fill in: the round's items and measurands; `?separator=semicolon` for decimal-comma spreadsheets. */
export const GET = handle(async (request: Request, { params }: Context) => {
  const { round } = await params;
  const query = new URL(request.url).searchParams;
  const separator = query.get('separator') === 'semicolon' ? ';' : ',';
  const who = await actorFromRequest(request);
  const isWhole = query.get('whole') === '1';
  const laboratoryId = Number(query.get('laboratory') ?? who?.laboratoryId ?? 0) || null;
  const actor = isWhole
    ? await authorise(who, 'round:load-results')
    : await authorise(who, 'own:view', { laboratoryId });
  const text = await addRefusal(actor, `template of ${round}`, () =>
    isWhole || laboratoryId === null
      ? roundTemplate(round, separator)
      : laboratoryTemplate(round, laboratoryId, separator),
  );
  return new Response(text, {
    headers: {
      'content-type': 'text/csv; charset=utf-8',
      'content-disposition': `attachment; filename="${round.replace(/[^a-z0-9-]/g, '')}-results.csv"`,
    },
  });
});
