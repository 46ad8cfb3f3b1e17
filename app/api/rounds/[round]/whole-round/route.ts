import { authorise } from '@/lib/auth/authorise';
import { addRefusal } from '@/lib/auth/refusals';
import { actorFromRequest } from '@/lib/auth/request';
import { handle } from '@/lib/http';
import { checkWholeRoundFile, loadWholeRound } from '@/lib/services/whole-round';
import { describeReport, refusedFile } from '@/lib/upload-answer';
import { readUploadedFile } from '@/lib/upload-body';

type Context = RouteContext<'/api/rounds/[round]/whole-round'>;

/** Takes a whole round as CSV, one row a laboratory and result; with `?check=1` nothing is stored. */
export const POST = handle(async (request: Request, { params }: Context) => {
  const { round } = await params;
  const actor = await authorise(await actorFromRequest(request), 'round:load-results');
  const file = await readUploadedFile(request);
  return addRefusal(actor, `whole round for ${round}`, async () => {
    const isCheck = new URL(request.url).searchParams.get('check') === '1';
    const load = isCheck ? await checkWholeRoundFile(round, file) : await loadWholeRound(actor, round, file);
    if (!load.report.ok) return refusedFile(load.report);
    const { report, laboratoryCount, resultCount } = load;
    const rows = isCheck ? { results: report.results } : {};
    return Response.json(
      { ...describeReport(report), ...rows, laboratoryCount, resultCount },
      { status: isCheck ? 200 : 201 },
    );
  });
});
