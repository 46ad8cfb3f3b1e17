import 'server-only';
import type { Db } from '../connection';

/** What an evaluation was computed from, as the text that was hashed. */
export async function getInputsText(connection: Db, evaluationId: number): Promise<string> {
  const row = await connection('evaluations').where({ id: evaluationId }).first('inputs_json');
  if (!row) throw new Error(`evaluation ${evaluationId} is missing`);
  return row.inputs_json;
}

/** The plan an evaluation was made by, as it stood then. */
export async function getSettingsText(connection: Db, evaluationId: number): Promise<string> {
  const row = await connection('evaluations').where({ id: evaluationId }).first('settings_json');
  if (!row) throw new Error(`evaluation ${evaluationId} is missing`);
  return row.settings_json;
}
