import { authorise } from '@/lib/auth/authorise';
import { addRefusal } from '@/lib/auth/refusals';
import { actorFromRequest } from '@/lib/auth/request';
import { handle } from '@/lib/http';
import { getOwnFile } from '@/lib/services/receipts';

type Context = RouteContext<'/laboratory/rounds/[round]/receipts/[code]/file'>;

/** The bytes of a submission as they were sent. Never shown in the browser: what is in them is not ours. */
export const GET = handle(async (request: Request, { params }: Context) => {
  const { round, code } = await params;
  const who = await actorFromRequest(request);
  const actor = await authorise(who, 'own:view', { laboratoryId: who?.laboratoryId });
  const file = await addRefusal(actor, `file of receipt ${code} of ${round}`, () =>
    getOwnFile(round, actor.laboratoryId ?? 0, code),
  );
  return new Response(new Uint8Array(file.bytes), {
    headers: {
      'content-type': 'application/octet-stream',
      'content-disposition': contentDisposition(file.fileName),
      'content-security-policy': "default-src 'none'; sandbox",
    },
  });
});

/** RFC 6266: a plain name for all, and the true one beside it. */
function contentDisposition(name: string): string {
  const plain = name.replace(/[^\w.-]+/g, '_').slice(0, 100) || 'results.csv';
  const encoded = encodeURIComponent(name).replace(
    /['()*]/g,
    (sign) => `%${sign.charCodeAt(0).toString(16).toUpperCase()}`,
  );
  return `attachment; filename="${plain}"; filename*=UTF-8''${encoded}`;
}
