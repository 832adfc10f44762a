/** The rules that are followed and the choices they leave open. */
import type { Field } from '../field.ts'
import { flag, object, share } from './entries.ts'

const factor = { is: 'number', from: 0, to: 5 } as const
const deflection = { is: 'number', from: 0.001, to: 100_000 } as const

export const BASIS = {
  basis: { name: 'Basis', meaning: 'Rules and choices.', entry: object, required: true },
  'basis.standard': {
    name: 'Rule set',
    meaning: '"us": ASCE 7, AISC 360, CMAA. "eu": EN 1991-3, EN 1993-6.',
    entry: { is: 'choice', of: ['us', 'eu'] },
    required: true,
    notCovered: { values: ['eu'] },
  },
  'basis.method': {
    name: 'Design method',
    meaning: 'Load and resistance factor design, or allowable strength design.',
    entry: { is: 'choice', of: ['LRFD', 'ASD'] },
    default: { entry: 'LRFD', source: 'AISC 360-22 B3 leaves the choice; the first named is taken' },
  },
  'basis.sideThrust': {
    name: 'Rule of side thrust',
    meaning: '"building": ASCE 7-22 4.9.4. "mill": the rule for mill buildings, AIST TR-13 (2021) 3.7.2.',
    entry: { is: 'choice', of: ['building', 'mill'] },
    default: { entry: 'building', source: 'ASCE 7-22 4.9.4' },
    notCovered: { values: ['mill'] },
  },
  'basis.buildingClass': {
    name: 'Building class',
    meaning: 'Class of the mill building; mill rule only.',
    entry: { is: 'choice', of: ['A', 'B', 'C', 'D'] },
    source: 'AIST TR-13 (2021) 1.4',
    notCovered: 'all',
  },
  'basis.sideThrustShare': {
    name: 'Share of side thrust',
    meaning:
      'Part of the side thrust that this rail takes: 0.5 where both rails guide the crane, 1 where only this one does.',
    entry: share,
    default: {
      entry: 0.5,
      source: 'both rails guide the crane; ASCE 7-22 4.9.4 asks for the share by lateral stiffness',
    },
  },
  'basis.sideThrustPerWheel': {
    name: 'Side thrust of each wheel',
    meaning: 'Equal on the wheels of the rail, or in proportion to their vertical loads.',
    entry: { is: 'choice', of: ['equal', 'by-load'] },
    default: { entry: 'equal', source: 'common practice' },
  },
  'basis.impact': {
    name: 'Vertical impact',
    meaning: '"standard": from the drives and the operation. Or a fraction of the wheel load.',
    entry: {
      is: 'either',
      of: [
        { is: 'choice', of: ['standard'] },
        { is: 'number', from: 0, to: 2 },
      ],
    },
    default: { entry: 'standard', source: 'ASCE 7-22 4.9.3 (from memory)' },
  },
  'basis.cb': {
    name: 'Moment gradient factor Cb',
    meaning: 'Taken as 1, or from the moment diagram at each position of the cranes.',
    entry: { is: 'choice', of: ['one', 'diagram'] },
    default: { entry: 'one', source: 'AISC 360-22 commentary F1' },
  },
  'basis.loadHeight': {
    name: 'Height of the load',
    meaning: 'Whether lateral-torsional buckling takes the wheels at the shear centre or at the rail.',
    entry: { is: 'choice', of: ['shear-centre', 'rail'] },
    default: { entry: 'shear-centre', source: 'AISC 360-22 chapter F; see its commentary F1' },
  },
  'basis.torsion': {
    name: 'Torsion',
    meaning: '"couple": a couple of horizontal forces on the flanges. "mixed": uniform and warping torsion together.',
    entry: { is: 'choice', of: ['couple', 'mixed'] },
    default: { entry: 'couple', source: 'common practice' },
    notCovered: { values: ['mixed'] },
  },
  'basis.craneDeadFactor': {
    name: 'Load factor of the crane’s own weight',
    meaning: '"as-live": 1.6 on the whole wheel load. "split": 1.2 on bridge and trolley, 1.6 on what is lifted.',
    entry: { is: 'choice', of: ['as-live', 'split'] },
    default: { entry: 'as-live', source: 'ASCE 7-22 chapter 2, crane load taken as live load' },
  },
  'basis.cranesTogether': {
    name: 'Cranes acting together',
    meaning:
      '"building": one crane with everything; two with impact and thrust of the worse one. "half-both": two with half the ' +
      'thrust of both. Or a list of sets of one’s own: a key for each crane that is there, its name or its index from 0.',
    entry: {
      is: 'either',
      of: [
        { is: 'choice', of: ['building', 'mill', 'half-both'] },
        {
          is: 'list',
          of: { is: 'map', key: 'crane', of: object, most: 20 },
          least: 1,
          most: 50,
        },
      ],
    },
    default: { entry: 'building', source: 'common practice, follows basis.sideThrust' },
    notCovered: { values: ['mill'] },
  },
  'basis.cranesTogether[].{crane}.vertical': {
    name: 'Vertical',
    meaning: 'Part of the static wheel loads that acts.',
    entry: factor,
    default: { entry: 1, source: 'a crane that is named in a set acts in full' },
  },
  'basis.cranesTogether[].{crane}.impact': {
    name: 'Impact',
    meaning: 'Part of the impact that acts.',
    entry: factor,
    default: { entry: 1, source: 'a crane that is named in a set acts in full' },
  },
  'basis.cranesTogether[].{crane}.sideThrust': {
    name: 'Side thrust',
    meaning: 'Part of the side thrust that acts.',
    entry: factor,
    default: { entry: 1, source: 'a crane that is named in a set acts in full' },
  },
  'basis.cranesTogether[].{crane}.longitudinal': {
    name: 'Longitudinal force',
    meaning: 'Part of the longitudinal force that acts.',
    entry: factor,
    default: { entry: 1, source: 'a crane that is named in a set acts in full' },
  },
  'basis.fatigueImpact': {
    name: 'Impact in fatigue',
    meaning: 'Whether the stress ranges of fatigue include impact.',
    entry: flag,
    default: { entry: false, source: 'AIST TR-13 (2021) 3.11.2.3' },
    notCovered: { unless: false },
  },
  'basis.deflection': {
    name: 'Deflection limits',
    meaning: 'As the n of span/n.',
    entry: object,
    default: { entry: {}, source: 'by the fields below' },
  },
  'basis.deflection.vertical': {
    name: 'Vertical deflection',
    meaning: 'The n of span/n for one crane, static, without dead load.',
    entry: deflection,
    default: {
      text: 'by service class: 600 for A to C, 800 for D, 1000 for E and F',
      source: 'AISC Design Guide 7 (from memory); CMAA 70 1.4.6 gives 600',
    },
  },
  'basis.deflection.lateral': {
    name: 'Lateral deflection',
    meaning: 'The n of span/n under side thrust, and under 10 % of the wheel loads.',
    entry: deflection,
    default: { text: '400', source: 'CMAA 70 1.4.6' },
  },
} as const satisfies Record<string, Field>
