/** Who may ask for what: every verb by everybody, worked out from the commands themselves. */
import { randomUUID } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { FLEET } from '../../commands/index.ts';
import {
  type Answer,
  type Call,
  type Command,
  type Desk,
  openRecordsDesk,
  ROLES,
  type Role,
} from '../../src/desk/index.ts';
import { openStore, type Store } from '../../src/store/index.ts';
import { textOf } from '../support/desk.ts';
import { ENGINES, newPlace } from '../support/places.ts';

/** One of each; the first who speaks is the owner. */
const NAMED: Readonly<Record<Role, string>> = {
  operator: 'Opal',
  engineer: 'Eli',
  supervisor: 'Suna',
  owner: 'Oda',
};

const ask = (desk: Desk, who: string, given: Call['given']): Promise<Answer> =>
  desk.answer({
    shop: 'Quillhaven',
    person: { id: who, name: who },
    place: { channel: 'floor', thread: null, isPrivate: false },
    interactionId: randomUUID(),
    given,
  });

const isBelow = (role: Role, needed: Role): boolean => ROLES.indexOf(role) < ROLES.indexOf(needed);

/** A line and a form: both ways in which a person can ask for it. */
const waysOf = ({ path, examples }: Command): readonly Call['given'][] => [
  ...examples.map((words) => ({ words })),
  { path, options: {} },
];

const refusesRole = (answer: Answer): boolean =>
  answer.kind === 'refusal' && answer.refusal.code === 'notAllowed';

describe.each(ENGINES)('on %s', (engine) => {
  const open: { desk?: Desk; store?: Store } = {};
  const desk = (): Desk => {
    if (open.desk === undefined) throw new Error('no desk');
    return open.desk;
  };

  beforeAll(async () => {
    const place = await newPlace(engine);
    const store = await openStore(place);
    const options = { platform: 'terminal', program: 'test', now: Date.now };
    open.desk = openRecordsDesk(FLEET, store, options);
    for (const role of ['supervisor', 'engineer', 'operator'] as const)
      await ask(desk(), NAMED.owner, { words: `/shop people add ${NAMED[role]} ${role}` });
    return async () => {
      await store.close();
      await place.remove();
    };
  });

  it.each(FLEET.map((command) => [command.path.join(' '), command] as const))(
    '/%s is for its role and those above, and tells the others whom to ask',
    async (_, command) => {
      const { allowed } = command;
      const may = ROLES.filter((role) => !isBelow(role, allowed)).map((role) => NAMED[role]);
      for (const role of ROLES)
        for (const given of waysOf(command)) {
          const answer = await ask(desk(), NAMED[role], given);
          if (!isBelow(role, allowed)) {
            expect([role, refusesRole(answer)]).toEqual([role, false]);
            continue;
          }
          expect(answer).toMatchObject({ refusal: { code: 'notAllowed', role: allowed } });
          const said = textOf(answer, 200);
          expect(said).toContain(`role ${allowed}`);
          for (const name of Object.values(NAMED))
            expect([name, said.includes(name)]).toEqual([name, may.includes(name)]);
        }
    },
  );

  it('somebody who was never seen may what an operator may, and no more', async () => {
    for (const command of FLEET) {
      const answer = await ask(desk(), `stranger ${randomUUID()}`, {
        words: command.examples[0] ?? '',
      });
      expect([command.path, refusesRole(answer)]).toEqual([
        command.path,
        command.allowed !== 'operator',
      ]);
    }
  });
});

it('what belongs to whom in a shop is what the commands ask for', () => {
  const roleOf = (path: string): Role | undefined =>
    FLEET.find((command) => command.path.join(' ') === path)?.allowed;
  for (const list of ['wheels', 'machines', 'materials', 'rules'])
    for (const verb of ['add', 'change', 'remove'])
      expect([list, verb, roleOf(`shop ${list} ${verb}`)]).toEqual([list, verb, 'supervisor']);
  for (const path of ['people add', 'people change', 'people remove', 'settings change', 'export'])
    expect([path, roleOf(`shop ${path}`)]).toEqual([path, 'owner']);
  for (const verb of ['setup', 'check', 'trouble', 'card', 'why', 'help'])
    expect([verb, roleOf(`knurl ${verb}`)]).toEqual([verb, 'operator']);
});
