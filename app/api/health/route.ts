import { db } from '@/db/connection';
import { pingDatabase } from '@/db/views/ping-view';
import { handle } from '@/lib/http';
import { logFault } from '@/lib/log';
import { version } from '@/package.json';

export const dynamic = 'force-dynamic';

/** Tells whoever starts or watches the application whether it can work. */
export const GET = handle(async () => {
  try {
    await pingDatabase(db());
  } catch (error) {
    logFault(error, { path: '/api/health' });
    return Response.json({ status: 'unavailable', version, database: 'unreachable' }, { status: 503 });
  }
  return Response.json({ status: 'ok', version, database: 'ok' });
});
