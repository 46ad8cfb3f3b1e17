import 'server-only';
import path from 'node:path';
import { Worker } from 'node:worker_threads';
import type { ComputedEvaluation } from '../compute-evaluation';

type Answer =
  | { readonly ready: true }
  | { readonly id: number; readonly computed: ComputedEvaluation }
  | { readonly id: number; readonly message: string };

interface Waiting {
  readonly resolve: (computed: ComputedEvaluation) => void;
  readonly reject: (error: Error) => void;
}

/** The thread could not be started or ended before it answered; the evaluation itself may well succeed elsewhere. */
export class WorkerLost extends Error {
  override readonly name = 'WorkerLost';
}

const START_LIMIT_MS = 20_000;
const SCRIPT = 'lib/services/evaluation-worker/worker.mjs';

class EvaluationThread {
  private readonly worker: Worker;
  private readonly waiting = new Map<number, Waiting>();
  private lastId = 0;
  private lost: WorkerLost | null = null;
  readonly ready: Promise<void>;

  constructor(script: string, onLost: () => void) {
    this.worker = new Worker(path.join(/* turbopackIgnore: true */ process.cwd(), script), {
      // The services say `server-only`, which only this condition lets pass outside of Next.js.
      execArgv: ['--conditions=react-server'],
    });
    this.ready = new Promise((resolve, reject) => {
      const limit = setTimeout(
        () => this.lose('it did not start in time', reject, onLost),
        START_LIMIT_MS,
      ).unref();
      this.worker.on('message', (answer: Answer) => {
        if (!('ready' in answer)) return this.settle(answer);
        clearTimeout(limit);
        resolve();
      });
      this.worker.once('error', (error) => this.lose(error.message, reject, onLost));
      this.worker.once('exit', (code) => this.lose(`it ended with code ${code}`, reject, onLost));
    });
    // Waited for where it is used; a thread that fails while no one waits must not end the process.
    this.ready.catch(() => undefined);
    this.worker.unref();
  }

  async evaluate(file: string, roundId: number): Promise<ComputedEvaluation> {
    if (this.lost) throw this.lost;
    this.lastId += 1;
    const id = this.lastId;
    // While something is under way the process stays; a warm thread alone does not keep it.
    this.worker.ref();
    return new Promise<ComputedEvaluation>((resolve, reject) => {
      this.waiting.set(id, { resolve, reject });
      this.worker.postMessage({ id, file, roundId });
    });
  }

  async end(): Promise<void> {
    await this.worker.terminate();
  }

  private settle(answer: Exclude<Answer, { ready: true }>): void {
    const waiting = this.waiting.get(answer.id);
    this.waiting.delete(answer.id);
    if (this.waiting.size === 0) this.worker.unref();
    if ('computed' in answer) waiting?.resolve(answer.computed);
    else waiting?.reject(new Error(answer.message));
  }

  private lose(reason: string, reject: (error: Error) => void, onLost: () => void): void {
    if (this.lost) return;
    this.lost = new WorkerLost(`The thread for evaluations is not there: ${reason}`);
    onLost();
    reject(this.lost);
    for (const waiting of this.waiting.values()) waiting.reject(this.lost);
    this.waiting.clear();
    void this.worker.terminate();
  }
}

const holder = globalThis as typeof globalThis & { assizeEvaluationThread?: EvaluationThread };

/**
 * Evaluates a round of a database file in a thread that stays warm for the next one.
 * @throws WorkerLost when there is no thread to do it; what goes wrong in the evaluation itself as it is
 */
export async function evaluateInWorker(
  file: string,
  roundId: number,
  script = SCRIPT,
): Promise<ComputedEvaluation> {
  holder.assizeEvaluationThread ??= new EvaluationThread(script, () => {
    delete holder.assizeEvaluationThread;
  });
  const thread = holder.assizeEvaluationThread;
  await thread.ready;
  return thread.evaluate(file, roundId);
}

/** Ends the warm thread, for tests and measurements. */
export async function endEvaluationThread(): Promise<void> {
  await holder.assizeEvaluationThread?.end();
  delete holder.assizeEvaluationThread;
}
