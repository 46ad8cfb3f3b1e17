import 'server-only';
import type { Db } from '../connection';

/** What an evaluation was computed from, as the text that was hashed. */
export async function getInputsText(connection: Db, evaluationId: number): Promise<string> {
  const row = await connection('evaluations').where({ id: evaluationId }).first('inputs_json');
  if (!row) throw new Error(`evaluation ${evaluationId} is missing`);
  return row.inputs_json;
}
