import { addRefusal } from '@/lib/auth/refusals';
import { authorise } from '@/lib/auth/authorise';
import { actorFromRequest } from '@/lib/auth/request';
import { handle } from '@/lib/http';
import { checkResultsFile, submitResultsFile } from '@/lib/services/submit-results';
import { describeReport, refusedFile } from '@/lib/upload-answer';
import { readUploadedFile } from '@/lib/upload-body';

type Context = RouteContext<'/api/rounds/[round]/results'>;

/** Takes a laboratory's results as CSV; with `?check=1` it says what would happen and submits nothing. */
export const POST = handle(async (request: Request, { params }: Context) => {
  const { round } = await params;
  const query = new URL(request.url).searchParams;
  const who = await actorFromRequest(request);
  const laboratoryId = Number(query.get('laboratory') ?? who?.laboratoryId ?? 0) || null;
  const actor = await authorise(who, 'own:submit', { laboratoryId });
  if (laboratoryId === null) throw new Error('own:submit was allowed without a laboratory');
  const file = await readUploadedFile(request);
  return addRefusal(actor, `results for round ${round}`, async () => {
    if (query.get('check') === '1') {
      const { report, sha256, current } = await checkResultsFile(actor, round, laboratoryId, file);
      if (!report.ok) return refusedFile(report);
      const wouldReplace = current && { receipt: current.receiptCode, submittedAt: current.submittedAt };
      return Response.json({ ...describeReport(report), sha256, results: report.results, wouldReplace });
    }
    const { report, receipt } = await submitResultsFile(actor, round, laboratoryId, file);
    if (!receipt) return refusedFile(report);
    const { receiptCode, replacedReceiptCode, isRepeat, ...rest } = receipt;
    return Response.json(
      {
        receipt: receiptCode,
        replaces: replacedReceiptCode,
        repeat: isRepeat,
        ...rest,
        notices: report.notices,
      },
      { status: isRepeat ? 200 : 201 },
    );
  });
});
