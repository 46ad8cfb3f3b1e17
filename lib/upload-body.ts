import 'server-only';
import { AppError } from './errors';
import { readBodyLimited } from './http';
import { MAX_BYTES } from './results-file';

/** Room for the boundaries and headers of a multipart body around the file itself. */
const MULTIPART_OVERHEAD = 64 * 1024;
const RAW_TYPES = ['text/csv', 'text/tab-separated-values', 'text/plain', 'application/octet-stream'];
const DEFAULT_NAME = 'results.csv';

export interface UploadedFile {
  bytes: Uint8Array;
  name: string;
}

/** The file of an upload: a multipart body with the field `file`, or the bare bytes of the file. */
export async function readUploadedFile(request: Request): Promise<UploadedFile> {
  const type = (request.headers.get('content-type') ?? '').split(';')[0]?.trim().toLowerCase() ?? '';
  if (type === 'multipart/form-data') return fileOfForm(request);
  if (type !== '' && !RAW_TYPES.includes(type)) {
    throw new AppError(
      'unsupported',
      `Found content of type ${type}. Send the CSV as text/csv, or as multipart/form-data with the field file.`,
    );
  }
  const bytes = await readBodyLimited(request, MAX_BYTES);
  return { bytes, name: new URL(request.url).searchParams.get('name') || DEFAULT_NAME };
}

async function fileOfForm(request: Request): Promise<UploadedFile> {
  const body = await readBodyLimited(request, MAX_BYTES + MULTIPART_OVERHEAD);
  const headers = { 'content-type': request.headers.get('content-type') ?? '' };
  let form: FormData;
  try {
    form = await new Response(new Uint8Array(body), { headers }).formData();
  } catch (cause) {
    throw new AppError('invalid', 'The multipart body could not be read. Send it again, whole.', { cause });
  }
  const file = form.get('file');
  if (!(file instanceof File)) {
    throw new AppError('invalid', 'The form has no file. Send the CSV in the field file.');
  }
  return { bytes: new Uint8Array(await file.arrayBuffer()), name: file.name || DEFAULT_NAME };
}
