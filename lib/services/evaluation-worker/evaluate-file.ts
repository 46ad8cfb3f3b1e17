import 'server-only';
import knex from 'knex';
import { knexConfig } from '@/db/config';
import { buffersOf, computeEvaluation, type ComputedEvaluation } from '../compute-evaluation';

/** Evaluates a round over a connection of its own, from one state of the database file. */
export async function evaluateFile(
  file: string,
  roundId: number,
): Promise<{ computed: ComputedEvaluation; buffers: ArrayBuffer[] }> {
  const connection = knex(knexConfig(file));
  try {
    const computed = await connection.transaction((trx) => computeEvaluation(trx, roundId));
    return { computed, buffers: buffersOf(computed) };
  } finally {
    await connection.destroy();
  }
}
