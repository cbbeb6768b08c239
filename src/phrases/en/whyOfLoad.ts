import type { FormulaWords } from './formulaWords.ts';

/** What the wheels press on, and what gives way. */
export const loadFormulas = {
  metalPressure: {
    says: 'Pressure under a tooth that is rolled into metal.',
    assumes:
      'Assumes Brinell hardness is the pressure at which metal gives way under a blunt body.',
  },
  plasticPressure: {
    says: 'Pressure under a tooth that is rolled into a plastic.',
    assumes: 'Assumes the plastic does not spring back before the wheel has passed.',
  },
  wedgeShare: {
    says: 'Share of the ground under a wheel that its teeth bear on.',
    assumes:
      'Assumes sharp teeth and flanks that bear as far down as the work has risen between them.',
  },
  meanWedgeShare: {
    says: 'Mean wedge share while a wheel sinks from touch to its whole infeed.',
    assumes: 'Assumes volume is kept, as for the infeed of the pattern.',
  },
  equivalentRadius: {
    says: 'Radius of the roller that would press a flat as a wheel presses a bar.',
    assumes: 'Assumes the contact is short against both radii.',
  },
  contactArc: {
    says: 'Length of the arc on which a wheel bears while it goes in deeper.',
    assumes: 'Assumes the wheel bears only on the side where it goes in.',
  },
  contactModulus: {
    says: 'Modulus of a contact between the work and a hardened wheel.',
    assumes: 'Assumes a steel wheel, and 0.29 for every work material.',
  },
  hertzHalfWidth: {
    says: 'Half width of a line contact that bears with a known mean pressure.',
    assumes: 'Assumes smooth rollers that spring and do not flow.',
  },
  trailingForce: {
    says: 'Force on the part of a wheel that follows its leading edge and only smooths.',
    assumes:
      'Assumes half the pressure of the leading part; an estimate, to be multiplied or divided by 2.',
  },
  plungeForce: {
    says: 'Force of one wheel that plunges: the first turn or the deepest of the others.',
    assumes: 'Assumes an even feed; an estimate, to be multiplied or divided by 2.',
  },
  traverseForce: {
    says: 'Force of one wheel that travels along the work.',
    assumes: 'Assumes one pass; an estimate, to be multiplied or divided by 2.',
  },
  forceBand: {
    says: 'The band in which a force lies that is known to a factor of 2.',
    assumes: 'Assumes the force is as likely to be twice as half of what is expected.',
  },
  wheelTorque: {
    says: 'Torque on the work from one wheel that rolls in it.',
    assumes:
      'Assumes the wheel idles, so the force passes through its axis, and bears in the middle of the arc.',
  },
  cutTorque: {
    says: "Torque on the work from a cut knurl's chip.",
    assumes: 'Assumes the chip is cut from the whole pattern, however many wheels share it.',
  },
  drivePower: {
    says: 'Power that a torque takes at a spindle speed.',
    assumes: 'Assumes nothing is lost in the drive.',
  },
  secondMoment: {
    says: 'Stiffness of a round section against bending, solid or hollow.',
    assumes: 'Assumes the bore runs through and stands in the middle.',
  },
  sectionModulus: {
    says: 'Strength of a round section against bending, solid or hollow.',
    assumes: 'Assumes the bore runs through and stands in the middle.',
  },
  bentInChuck: {
    says: 'Bending of a bar held in the chuck alone.',
    assumes: 'Assumes jaws that do not give.',
  },
  bentByTailstock: {
    says: 'Bending of a bar held in the chuck and by a tailstock.',
    assumes: 'Assumes jaws and a centre that do not give.',
  },
  bentBetweenCentres: {
    says: 'Bending of a bar between centres.',
    assumes: 'Assumes centres that do not give and hold no moment.',
  },
  bentWork: {
    says: 'How a bar bends under the wheels of one side, and how uneven that makes the knurl.',
    assumes:
      'Assumes the knurl ends where the bar does, and a tailstock 25 mm past the farthest place of the wheel.',
  },
  ringWidth: {
    says: 'Width of tube that shares the load of a wheel.',
    assumes: 'Assumes the tube goes on at both sides of the wheel.',
  },
  pinchedRing: {
    says: 'A thin ring pinched between two forces that face each other.',
    assumes:
      'Assumes a ring so thin that only its bending counts; a thicker one closes by other ways as well.',
  },
  wheelRotation: {
    says: 'Rotation of the wheel on its pin.',
    assumes: 'Assumes the wheel rolls without slip.',
  },
  pinSliding: {
    says: "Speed at which the wheel's bore slides on the pin.",
    assumes: 'Assumes the pin stands still.',
  },
  pinBearing: {
    says: 'Pressure of the wheel on its pin.',
    assumes: 'Assumes the bore bears on its whole length.',
  },
  pinHeat: {
    says: 'Heat that rubbing makes on the pin.',
    assumes: 'Assumes oil on the pin.',
  },
  ordinaryPinHeat: {
    says: 'Heat on a square millimetre of pin in the plunge that is called 1.',
    assumes: "Assumes the trade's limit of 100 ft/min is meant for an ordinary plunge in steel.",
  },
  pinHeatIndex: {
    says: "Heat on a pin against that of an ordinary plunge at the trade's limit.",
    assumes: 'Assumes oil on the pin; no absolute limit is to be had, so this is a comparison.',
  },
  wheelWarmUp: {
    says: 'How much warmer the whole wheel gets in a cut when no heat leaves it.',
    assumes: 'Assumes a steel wheel that was cold, and all the heat in it.',
  },
} as const satisfies Record<string, FormulaWords>;
