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

  it('writes the pictures of one answer as SVG and PNG, and says where', async () => {
    const folder = path.join(data, 'pictures');
    const ran = await ask('--pictures', folder, '/knurl 1.000 straight 21tpi 1018');
    expect(ran.code).toBe(0);
    const names = ['1-toothForm', '2-trackingStrip', '3-setupSketch'];
    expect(fs.readdirSync(folder).sort()).toEqual(
      names.flatMap((name) => [`${name}.png`, `${name}.svg`]),
    );
    for (const name of names) {
      const file = path.join(folder, name);
      expect(ran.said).toContain(`Picture: ${file}.png`);
      // evidence: PNG, third edition, 5.2: the eight bytes every such file begins with
      expect(fs.readFileSync(`${file}.png`).subarray(0, 8).toString('hex')).toBe(
        '89504e470d0a1a0a',
      );
      expect(fs.readFileSync(`${file}.svg`, 'utf8')).toMatch(/^<svg xmlns=/u);
    }
    const json = await ask('--json', '--pictures', folder, '/knurl 1.000 straight 21tpi 1018');
    expect(answerSchema.parse(JSON.parse(json.said)).refusal).toBeNull();
    expect(json.faults).toContain('Picture: ');
  });

  it('gives the whole card where the folder cannot be written', async () => {
    const file = path.join(data, 'no-folder');
    fs.writeFileSync(file, '');
    const ran = await ask('--pictures', file, '/knurl 1.000 straight 21tpi 1018');
    expect(ran.code).toBe(0);
    expect(ran.said).toContain('Turn to 0.9852 in: 65 teeth');
    expect(ran.said).toContain('Nothing else is missing from the card.');
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
