/**
 * The whole check, as `npm test` runs it: types, format, lint, who imports whom, what nothing
 * uses, and the tests. Arguments choose tests (npm test -- test/calc); the rest always runs.
 */
import { spawn } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { explain, ready, root } from './ready.mjs';

const RESULTS = path.join(root, 'dist', '.test-results.json');

/**
 * @typedef {{ heading: string, file: string, args: string[] }} Step
 * @typedef {{ status: string, message?: string, assertionResults: { status: string }[] }} TestFile
 * @typedef {{ numPassedTests: number, numFailedTests: number, testResults: TestFile[] }} Results
 */

/** @param {string} heading @param {string} file @param {string[]} args @returns {Step} */
const step = (heading, file, ...args) => ({ heading, file: path.join('node_modules', file), args });

/** Steps of one row run side by side; what they say is shown in this order. */
const rows = [
  [
    step('Types', 'typescript/bin/tsc', '-p', '.config/tsconfig.test.json'),
    step('Format', '@biomejs/biome/bin/biome', 'check', '--config-path=.config/format.json'),
  ],
  [
    step('Lint', 'eslint/bin/eslint.js', '--config', '.config/eslint.config.js', '.'),
    step(
      'Who imports whom',
      'dependency-cruiser/bin/dependency-cruise.mjs',
      '--config',
      '.config/dependency-cruiser.config.cjs',
      ...['src', 'commands', 'test'].filter((folder) => fs.existsSync(path.join(root, folder))),
    ),
  ],
  [step('Unused', 'knip/bin/knip.js', '--config', '.config/knip.json', '--no-progress')],
];

/** @param {number} since */
const seconds = (since) => `${((performance.now() - since) / 1000).toFixed(1)} s`;

/** @param {Step} wanted @returns {Promise<{ code: number, took: string, said: string }>} */
function quietly({ file, args }) {
  const since = performance.now();
  return new Promise((resolve) => {
    const child = spawn(process.execPath, [file, ...args], { cwd: root });
    /** @type {Buffer[]} */
    const said = [];
    child.stdout.on('data', (/** @type {Buffer} */ chunk) => said.push(chunk));
    child.stderr.on('data', (/** @type {Buffer} */ chunk) => said.push(chunk));
    child.on('close', (code) => {
      resolve({ code: code ?? 1, took: seconds(since), said: Buffer.concat(said).toString() });
    });
  });
}

/** @param {string} heading @param {string} took @param {number} code @param {string} said */
function show(heading, took, code, said) {
  console.log(`── ${heading}: ${code === 0 ? 'in order' : 'faults found'}, ${took}`);
  if (code !== 0) console.log(said.trimEnd());
}

/** @returns {Promise<number>} the exit code of the first step that found faults, or 0 */
async function runSteps() {
  for (const row of rows) {
    const results = await Promise.all(row.map(quietly));
    row.forEach(({ heading }, i) => {
      const result = results[i];
      if (result) show(heading, result.took, result.code, result.said);
    });
    const failed = results.find(({ code }) => code !== 0);
    if (failed) return failed.code;
  }
  return 0;
}

/** @param {string[]} chosen @returns {Promise<number>} */
function runTests(chosen) {
  fs.rmSync(RESULTS, { force: true });
  console.log('── Tests');
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${RESULTS}`];
  const args = ['node_modules/vitest/vitest.mjs', 'run', '--config', '.config/vitest.config.ts'];
  return new Promise((resolve) => {
    const child = spawn(process.execPath, [...args, ...reporters, ...chosen], {
      cwd: root,
      stdio: 'inherit',
    });
    child.on('close', (code) => {
      resolve(code ?? 1);
    });
  });
}

/** The numbers vitest wrote. A file that failed before its first test counts as one failure.
 * @returns {{ passed: number, failed: number } | undefined} */
function tally() {
  if (!fs.existsSync(RESULTS)) return undefined;
  /** @type {unknown} */
  const written = JSON.parse(fs.readFileSync(RESULTS, 'utf8'));
  const results = /** @type {Results} */ (written);
  const unread = results.testResults.filter(
    ({ status, assertionResults }) =>
      status === 'failed' && !assertionResults.some((test) => test.status === 'failed'),
  );
  const failed = results.numFailedTests + unread.length;
  return { passed: results.numPassedTests, failed };
}

async function check() {
  await ready();
  const faults = await runSteps();
  if (faults !== 0) return faults;
  const code = await runTests(process.argv.slice(2));
  const counted = tally();
  if (counted === undefined) {
    console.log('The tests left no result: they ended before they could report.');
    return code === 0 ? 1 : code;
  }
  console.log(`${counted.passed} passed, ${counted.failed} failed`);
  // The numbers decide too: a library that ends the process early must not turn a failure into 0.
  return counted.failed > 0 && code === 0 ? 1 : code;
}

try {
  process.exitCode = await check();
} catch (error) {
  explain(error);
  process.exitCode = 1;
}
