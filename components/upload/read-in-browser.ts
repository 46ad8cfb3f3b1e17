import type { FileKind, Table } from '@/lib/results-file';

/** Above this the rows are not read in the browser as well; the list of problems says what is wrong and where. */
const MAX_BYTES_READ_HERE = 2_000_000;

/**
 * The rows of a refused file as they stand in it, read by the same code as on the server, so that errors can be
 * shown at their cells. Null when they cannot be read. The code is fetched only now, since good files never need it.
 */
export async function readRowsHere(bytes: Blob, kind: FileKind): Promise<Table | null> {
  if (bytes.size > MAX_BYTES_READ_HERE) return null;
  const { decodeFile, readTable } = await import('@/lib/results-file');
  const decoded = decodeFile(new Uint8Array(await bytes.arrayBuffer()));
  if (!decoded.ok) return null;
  const table = readTable(decoded.text, kind);
  return table.usable ? table : null;
}
