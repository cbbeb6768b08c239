/**
 * Makes sure that the packages are installed and the program is built, and costs next to nothing
 * when both are. Plain Node without packages, because it runs before there are any.
 *
 *     node .config/ready.mjs              install and build what is stale
 *     node .config/ready.mjs --installed  npm has just installed (its "prepare" step): note that, build
 */
import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { alone } from './alone.mjs';

export const root = fileURLToPath(new URL('..', import.meta.url));
const at = (/** @type {string[]} */ ...parts) => path.join(root, ...parts);

const SOURCES = ['src', 'commands'];
const INSTALL_STAMP = at('node_modules', '.wholetooth-installed');
const BUILD_STAMP = at('dist', '.built');
const BUILD_INFO = at('dist', '.tsbuildinfo');
const LOCK = at('dist', '.lock');
const COMPILER = at('node_modules', 'typescript', 'bin', 'tsc');

/** Set for the `npm ci` that is started here, so that its "prepare" step leaves the build to us. */
const NESTED = 'WHOLETOOTH_INSTALLING';

/** Something a person can put right: a sentence that says what failed and what to do. */
export class NotReady extends Error {}

/** @param {string} file */
function read(file) {
  try {
    return fs.readFileSync(file, 'utf8');
  } catch {
    return undefined;
  }
}

/** @param {string} file
 * @returns {unknown} */
function readJson(file) {
  try {
    return JSON.parse(read(file) ?? 'null');
  } catch {
    return null;
  }
}

/** All files below a folder, sorted, so that one content has one hash.
 * @param {string} folder
 * @returns {string[]} */
function filesBelow(folder) {
  if (!fs.existsSync(folder)) return [];
  return fs
    .readdirSync(folder, { withFileTypes: true })
    .sort((a, b) => (a.name < b.name ? -1 : 1))
    .flatMap((entry) => {
      const file = path.join(folder, entry.name);
      return entry.isDirectory() ? filesBelow(file) : [file];
    });
}

/** @param {string[]} files */
function hashOf(files) {
  const hash = createHash('sha256');
  for (const file of files) {
    const text = read(file);
    hash.update(`${path.relative(root, file)}\0${text === undefined ? 'absent' : text.length}\0`);
    hash.update(text ?? '');
  }
  return hash.digest('hex');
}

// ── installing ──────────────────────────────────────────────────────────────────────────────────

/**
 * @typedef {{ packages: string, modules: string, platform: string }} InstallMark
 * @typedef {Record<string, Record<string, string>>} Asked as package.json lists packages
 * @typedef {{ version?: string, integrity?: string, optional?: boolean }} Entry
 * @typedef {{ packages?: Record<string, Entry> }} Lock
 */

/** The packages asked for, and the binary interface that compiled ones were built for.
 * @returns {InstallMark} */
function installMark() {
  const packages = hashOf([at('package.json'), at('package-lock.json')]);
  return {
    packages,
    modules: process.versions.modules,
    platform: `${process.platform}-${process.arch}`,
  };
}

/** @returns {boolean} */
function isInstalled() {
  const stamp = /** @type {Partial<InstallMark> | null} */ (readJson(INSTALL_STAMP));
  const wanted = installMark();
  if (stamp?.modules !== wanted.modules || stamp.platform !== wanted.platform) return false;
  return stamp.packages === wanted.packages || installAgreesWithLock();
}

/** package.json may change without any package changing (a script, a description): npm's own
 * record of what it installed then still agrees with the lock file, and nothing is to be done. */
function installAgreesWithLock() {
  const lock = /** @type {Lock | null} */ (readJson(at('package-lock.json')))?.packages;
  const record = readJson(at('node_modules', '.package-lock.json'));
  const installed = /** @type {Lock | null} */ (record)?.packages;
  if (!lock || !installed || !lockAgreesWithPackage(lock)) return false;
  const names = new Set([...Object.keys(lock), ...Object.keys(installed)]);
  names.delete('');
  for (const name of names) {
    // Binaries for other platforms are in the lock file and rightly not installed.
    if (!installed[name] && lock[name]?.optional) continue;
    if (installed[name]?.version !== lock[name]?.version) return false;
    if (installed[name]?.integrity !== lock[name]?.integrity) return false;
  }
  writeStamp(INSTALL_STAMP, installMark());
  return true;
}

/** @param {Record<string, Entry>} lock */
function lockAgreesWithPackage(lock) {
  const asked = /** @type {Asked | null} */ (readJson(at('package.json')));
  const locked = /** @type {Asked | undefined} */ (lock['']);
  const sorted = (/** @type {Record<string, string> | undefined} */ list) =>
    JSON.stringify(Object.entries(list ?? {}).sort());
  const kinds = ['dependencies', 'devDependencies', 'optionalDependencies'];
  return kinds.every((kind) => sorted(locked?.[kind]) === sorted(asked?.[kind]));
}

async function install() {
  process.stderr.write('Installing packages (the first time takes a minute or two) …\n');
  const flags = ['ci', '--include=dev', '--no-audit', '--no-fund'];
  const npm = process.env['npm_execpath'];
  const [command, args] =
    npm && /npm-cli\.c?js$/.test(npm) ? [process.execPath, [npm, ...flags]] : ['npm', flags];
  const code = await run(command, args, { [NESTED]: String(process.pid) });
  if (code !== 0) {
    throw new NotReady(
      'The packages could not be installed: "npm ci" failed as shown above. Check the connection to the package registry and that g++, make and python3 are there, then start again.',
    );
  }
  writeStamp(INSTALL_STAMP, installMark());
}

// ── building ────────────────────────────────────────────────────────────────────────────────────

function sources() {
  return SOURCES.flatMap((folder) => filesBelow(at(folder)));
}

/** @param {string[]} files */
function buildMark(files) {
  return { sources: hashOf([...files, at('tsconfig.json'), at('package-lock.json')]) };
}

/** @param {string} source */
function builtFile(source) {
  return at('dist', path.relative(root, source).replace(/\.ts$/, '.js'));
}

function isBuilt() {
  const stamp = /** @type {{ sources?: string } | null} */ (readJson(BUILD_STAMP));
  return stamp?.sources === buildMark(sources()).sources;
}

async function build() {
  const files = sources();
  if (files.length === 0) return;
  // Taken before compiling: a file that is saved meanwhile makes the next start compile again.
  const mark = buildMark(files);
  const wanted = files.filter((f) => f.endsWith('.ts') && !f.endsWith('.d.ts')).map(builtFile);
  await compile();
  if (!wanted.every((file) => fs.existsSync(file))) {
    // The compiler writes only what changed since its own record; files were removed behind it.
    fs.rmSync(BUILD_INFO, { force: true });
    await compile();
  }
  removeLeftovers(new Set(wanted));
  writeStamp(BUILD_STAMP, mark);
}

async function compile() {
  const code = await run(process.execPath, [COMPILER, '-p', at('tsconfig.json')]);
  if (code === 0) return;
  throw new NotReady(
    'The program could not be built: the compiler names the lines above. Correct them, then start again.',
  );
}

/** Built files whose source is gone would still be found by an import.
 * @param {Set<string>} wanted */
function removeLeftovers(wanted) {
  for (const file of SOURCES.flatMap((folder) => filesBelow(at('dist', folder)))) {
    const script = file.replace(/\.map$/, '');
    if (script.endsWith('.js') && !wanted.has(script)) fs.rmSync(file, { force: true });
  }
}

// ── helpers ─────────────────────────────────────────────────────────────────────────────────────

/** Written beside and renamed, so that a stamp is whole or absent.
 * @param {string} file
 * @param {object} mark */
function writeStamp(file, mark) {
  fs.mkdirSync(path.dirname(file), { recursive: true });
  const draft = `${file}.${String(process.pid)}`;
  fs.writeFileSync(draft, `${JSON.stringify(mark)}\n`);
  fs.renameSync(draft, file);
}

/** Runs a program with everything it says on stderr: stdout belongs to the program asked for.
 * A signal goes to the child first, so that no installation is left running without its lock.
 * @param {string} command
 * @param {string[]} args
 * @param {Record<string, string>} [env]
 * @returns {Promise<number>} */
function run(command, args, env = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, {
      cwd: root,
      env: { ...process.env, ...env },
      stdio: ['ignore', process.stderr, process.stderr],
      shell: process.platform === 'win32' && command === 'npm',
    });
    /** @type {NodeJS.Signals[]} */
    const signals = ['SIGINT', 'SIGTERM'];
    let stopped = false;
    const passOn = (/** @type {NodeJS.Signals} */ signal) => {
      stopped = true;
      child.kill(signal);
    };
    for (const signal of signals) process.on(signal, passOn);
    const finish = (/** @type {number | null} */ code) => {
      for (const signal of signals) process.off(signal, passOn);
      if (stopped)
        reject(new NotReady('Stopped while installing or building. Start again to go on.'));
      else resolve(code ?? 1);
    };
    child.on('error', (error) => {
      process.stderr.write(`${error.message}\n`);
      finish(1);
    });
    child.on('close', finish);
  });
}

function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major > 20 || (major === 20 && minor >= 19)) return;
  throw new NotReady(
    `Wholetooth needs Node 20.19 or newer and this is ${process.versions.node}. Install a newer Node, then start again.`,
  );
}

// ── the two ways in ─────────────────────────────────────────────────────────────────────────────

/** Installs and builds what is stale. Throws NotReady with a sentence when that fails. */
export async function ready() {
  checkNode();
  if (isInstalled() && isBuilt()) return;
  await alone(LOCK, async () => {
    if (!isInstalled()) await install();
    if (!isBuilt()) await build();
  });
}

/** The "prepare" step of npm. Without the compiler (npm ci --omit=dev) there is nothing to do here. */
async function afterInstall() {
  checkNode();
  if (process.env[NESTED] !== undefined || !fs.existsSync(COMPILER)) return;
  await alone(LOCK, async () => {
    writeStamp(INSTALL_STAMP, installMark());
    // What npm was asked for is done; sources that do not compile are said, and said again at start.
    if (!isBuilt()) await build().catch(explain);
  });
}

/** @param {unknown} error */
export function explain(error) {
  const sentence =
    error instanceof NotReady
      ? error.message
      : `Wholetooth could not be made ready: ${error instanceof Error ? error.message : String(error)}. Check that this folder may be written to, then start again.`;
  process.stderr.write(`${sentence}\n`);
}

if (
  process.argv[1] !== undefined &&
  fs.realpathSync(process.argv[1]) === fileURLToPath(import.meta.url)
) {
  try {
    await (process.argv.includes('--installed') ? afterInstall() : ready());
  } catch (error) {
    explain(error);
    process.exitCode = 1;
  }
}
