import { ENGINEER, OPERATORS, OWNER, type Said, SUPERVISOR } from './said.ts';

/** The invented shop's crib, as its supervisor had it in a spreadsheet. */
const CRIB = `name,form,pitch,teeth,diameter mm,face mm,bore mm,bevel mm,edge,place,parts run,state
Fern,straight,21 tpi,50,19.02,8,6,1,bevelled,drawer 1,1850,good
Willow,straight,21 tpi,,20,8,6,1,bevelled,drawer 1,240,good
Juniper,straight,25 tpi,61,19.75,8,6,1,bevelled,drawer 1,0,good
Linden,straight,33 tpi,81,19.85,6,6,1,bevelled,drawer 2,610,good
Thistle,straight,96 dp,72,19.05,6,6,1,bevelled,drawer 2,3100,worn
Clover,straight,0.8 mm,78,19.9,8,6,1,bevelled,drawer 2,95,good
Heron left,left,21 tpi,,20,8,6,1,bevelled,drawer 3,420,good
Heron right,right,21 tpi,,20,8,6,1,bevelled,drawer 3,420,good
Swift left,left,1.0 mm,62,19.8,8,6,1,bevelled,drawer 3,1200,good
Swift right,right,1.0 mm,62,19.8,8,6,1,bevelled,drawer 3,1200,good
Old Bramble,straight,21 tpi,49,18.7,8,6,,square,drawer 4,7400,damaged
Sorrel,sunk,14 tpi,,25,10,8,,square,drawer 4,0,good
`;

const people: readonly Said[] = [
  { by: OWNER, line: `/shop people add ${SUPERVISOR} supervisor` },
  { by: OWNER, line: `/shop people add ${ENGINEER} engineer` },
  ...OPERATORS.map((name) => ({ by: OWNER, line: `/shop people add ${name} operator` })),
];

const settings: readonly Said[] = [
  {
    by: OWNER,
    line: '/shop settings change units in standards #standards questions #questions notices #notices',
  },
];

const machines: readonly Said[] = [
  'Bench lathe speeds 70 115 180 280 430 700 1100 rpm feeds 0.0015 0.003 0.005 0.008 0.012 dial reads diameter inch dials swing 10 in power 1.5 hp',
  'Long bed speeds 45 75 120 190 300 480 760 rpm feeds 0.002 0.004 0.008 0.016 dial reads radius inch dials swing 16 in power 5 hp',
  'Bar turner speeds 100 to 4000 rpm feeds 0.0005 to 0.02 dial reads diameter metric dials swing 4 in power 7.5 kW',
].map((words) => ({ by: SUPERVISOR, line: `/shop machines add ${words}` }));

const materials: readonly Said[] = [
  'yellow bar as 1018 HB 155 note "from the yellow rack"',
  'green bar as 12L14',
  'pump shaft as 303 HB 210',
].map((words) => ({ by: SUPERVISOR, line: `/shop materials add ${words}` }));

const rules: readonly Said[] = [
  'Sleeves above the elbow at every lathe',
  'Brush, never a rag, near the wheel',
  'Chip guard down before the spindle starts only on Bar turner',
  'Flood coolant only for 303',
].map((words) => ({ by: SUPERVISOR, line: `/shop rules add ${words}` }));

/** What the shop is: its people, wheels, machines, materials and rules. */
export const FLOOR: readonly Said[] = [
  ...people,
  ...settings,
  {
    by: SUPERVISOR,
    line: '/shop wheels import',
    attached: { name: 'crib.csv', text: CRIB },
  },
  ...machines,
  ...materials,
  ...rules,
];
