import fs from 'node:fs';
import { step, Stop } from './report.mjs';
import { runOrStop } from './run.mjs';

const DEFAULT_PATH = '/usr/bin/chromium';
const INSTALL = 'apt-get install -y --no-install-recommends chromium';

export function chromiumPath() {
  return process.env.CHROMIUM_PATH || DEFAULT_PATH;
}

/** The end-to-end tests need a Chromium; as root on Debian it is installed, else the command is told. */
export async function requireChromium() {
  await step('Chromium', async (announce) => {
    if (fs.existsSync(chromiumPath())) return chromiumPath();
    if (process.env.CHROMIUM_PATH) {
      throw new Stop(
        `CHROMIUM_PATH names ${chromiumPath()}, which is not there. Correct it, or leave it out.`,
      );
    }
    const canInstall = process.getuid?.() === 0 && fs.existsSync('/usr/bin/apt-get');
    if (!canInstall) {
      throw new Stop(
        `The end-to-end tests need Chromium. Install it once with: sudo apt-get update && sudo ${INSTALL}\nElsewhere set CHROMIUM_PATH to a Chromium that is there.`,
      );
    }
    announce('installing from Debian');
    await runOrStop('sh', ['-c', `apt-get update && ${INSTALL}`], {
      env: { DEBIAN_FRONTEND: 'noninteractive' },
      message: `Chromium could not be installed. Try by hand: apt-get update && ${INSTALL}`,
    });
    return 'done';
  });
}
