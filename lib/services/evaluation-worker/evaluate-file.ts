import 'server-only';
import { openDatabase } from '@/db/connection';
import { buffersOf, computeEvaluation, type ComputedEvaluation } from '../compute-evaluation';

/** Evaluates a round over a connection of its own, from one state of the database file. */
export async function evaluateFile(
  file: string,
  roundId: number,
): Promise<{ computed: ComputedEvaluation; buffers: ArrayBuffer[] }> {
  const connection = openDatabase(file);
  try {
    const computed = await connection.transaction((trx) => computeEvaluation(trx, roundId));
    return { computed, buffers: buffersOf(computed) };
  } finally {
    await connection.destroy();
  }
}
