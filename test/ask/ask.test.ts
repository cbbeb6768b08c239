/** The programs as a person starts them: `ask` for one line, and the channel fed from a pipe. */
import { spawn } from 'node:child_process';
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, describe, expect, it } from 'vitest';
import { answerSchema, setupSchema } from './answerSchema.ts';

const root = fileURLToPath(new URL('../..', import.meta.url));
const data = fs.mkdtempSync(path.join(os.tmpdir(), 'wholetooth-ask-'));
afterAll(() => {
  fs.rmSync(data, { recursive: true, force: true });
});

type Ran = { readonly code: number | null; readonly said: string; readonly faults: string };

const run = (command: string, args: readonly string[], input = ''): Promise<Ran> =>
  new Promise((done) => {
    const environment = { ...process.env, WHOLETOOTH_DATA: data, DATABASE_URL: '' };
    const child = spawn(command, args, { cwd: root, env: environment });
    let [said, faults] = ['', ''];
    child.stdout.on('data', (part: Buffer) => {
      said += part.toString();
    });
    child.stderr.on('data', (part: Buffer) => {
      faults += part.toString();
    });
    child.on('close', (code) => {
      done({ code, said, faults });
    });
    child.stdin.end(input);
  });

const ask = (...args: readonly string[]): Promise<Ran> =>
  run(process.execPath, ['.config/run.mjs', 'src/ask', ...args]);

describe('ask', () => {
  it('prints one JSON object and nothing else for a card, and ends with 0', async () => {
    const ran = await run('npm', [
      'run',
      '--silent',
      'ask',
      '--',
      '--json',
      '/knurl 1.000 straight 21tpi 1018',
    ]);
    expect(ran.code).toBe(0);
    expect(ran.said.trimEnd().split('\n')).toHaveLength(1);
    const object = setupSchema.parse(JSON.parse(ran.said));
    // evidence: D = N p_t/π, 65 × 25.4/21/π = 25.02522 mm
    expect(object.figures['blankDiameter']?.value).toBeCloseTo(25.02522, 5);
    expect(object.refusal).toBeNull();
  });

  it('prints one JSON object for a refusal, and ends with 1', async () => {
    const ran = await ask('--json', '/knurl 1.0 straigt 21tpi');
    expect(ran.code).toBe(1);
    const object = answerSchema.parse(JSON.parse(ran.said));
    expect(object.refusal).toMatchObject({
      code: 'unreadable',
      word: 'straigt',
      start: 11,
      end: 18,
    });
    expect(object.choices[0]?.words).toBe('/knurl 1.0 straight 21tpi');
  });

  it('takes the unit of bare numbers', async () => {
    const ran = await ask('--units', 'mm', '--json', '/knurl 25 straight 1.0 pitch');
    expect(ran.code).toBe(0);
    const object = setupSchema.parse(JSON.parse(ran.said));
    // evidence: ⌊25 π⌋ = 78 teeth of 1 mm
    expect(object.figures['toothCount']?.value).toBe(78);
  });

  it('keeps a card to the width of a phone', async () => {
    const ran = await ask('--phone', '/knurl 1.000 diamond 21tpi 304 long 1.5 out 3');
    expect(ran.code).toBe(0);
    for (const line of ran.said.split('\n')) expect(line.length).toBeLessThanOrEqual(48);
  });

  it('says how it is called where the call makes no sense, and ends with 2', async () => {
    const ran = await ask('--units', 'furlong', '/knurl 1.0');
    expect(ran.code).toBe(2);
    expect(ran.said).toBe('');
    expect(ran.faults).toContain('--units takes in or mm.');
  });
});

describe('the channel from a pipe', () => {
  it('says in two lines what it is, gives one card a line, and ends with the input', async () => {
    const lines = '1.000 straight 21tpi 1018\n/knurl 1.0 straight\n\n';
    const ran = await run(process.execPath, ['.config/run.mjs', 'src/main'], lines);
    expect(ran.code).toBe(0);
    const [first, second] = ran.said.split('\n');
    expect(first).toContain('Wholetooth, local channel');
    expect(second).toContain('README');
    expect(ran.said).toContain('Turn to 0.9852 in: 65 teeth');
    expect(ran.said).toContain('The pitch is missing.');
    // An empty line is helped.
    expect(ran.said).toContain('Say the bar, the pattern and the pitch');
  });
});
