// The thread that evaluates large rounds. Started by path and not bundled, hence plain JavaScript; tsx loads the rest. It
// is asked for here because `--import tsx` does nothing in a thread.
import { parentPort } from 'node:worker_threads';
import { register } from 'tsx/esm/api';

register();
const { evaluateFile } = await import('./evaluate-file.ts');

parentPort.on('message', async ({ id, file, roundId }) => {
  try {
    const { computed, buffers } = await evaluateFile(file, roundId);
    parentPort.postMessage({ id, computed }, buffers);
  } catch (error) {
    parentPort.postMessage({ id, message: error instanceof Error ? error.message : String(error) });
  }
});
parentPort.postMessage({ ready: true });
