/**
 * Makes the project ready, then runs one built file in this same process, so that its input,
 * output, signals and exit code are the program's own.
 *
 *     node .config/run.mjs src/main [arguments]
 */
import fs from 'node:fs';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { explain, NotReady, ready, root } from './ready.mjs';

const [script, ...args] = process.argv.slice(2);

/** @returns {Promise<string | undefined>} the built file, or nothing when the reason has been said */
async function prepare() {
  try {
    if (script === undefined) {
      throw new NotReady('Say what to run, for example: node .config/run.mjs src/main');
    }
    await ready();
    const file = path.join(root, 'dist', `${script.replace(/\.[jt]s$/, '')}.js`);
    if (!fs.existsSync(file)) {
      throw new NotReady(
        `There is no program ${script}: ${path.relative(root, file)} is not built. Give the path of a source file without its ending, for example src/main.`,
      );
    }
    return file;
  } catch (error) {
    explain(error);
    return undefined;
  }
}

const file = await prepare();
if (file === undefined) {
  process.exitCode = 1;
} else {
  process.setSourceMapsEnabled(true);
  process.argv = [process.execPath, file, ...args];
  await import(pathToFileURL(file).href);
}
