/** The line of girders, its supports and its rail. */
import type { Field } from '../field.ts'
import { dimension, distance, flag, object, share } from './entries.ts'

const span = { is: 'quantity', kind: 'distance', from: '0.1 m', to: '100 m' } as const
const detail = { is: 'quantity', kind: 'length', from: '0 mm', to: '10 m' } as const

export const RUNWAY = {
  runway: { name: 'Runway', meaning: 'The line of girders and its rail.', entry: object, required: true },
  'runway.spans': {
    name: 'Spans',
    meaning: 'From centre to centre of the bearings, from left to right.',
    entry: { is: 'list', of: span, least: 1, most: 100 },
    required: true,
  },
  'runway.continuity': {
    name: 'Continuity',
    meaning: '"simple": each span its own girder. "continuous": one girder over all spans.',
    entry: { is: 'choice', of: ['simple', 'continuous'] },
    default: { entry: 'simple', source: 'AIST TR-13 (2021) 5.8.1: no appreciable continuity between spans' },
    notCovered: { values: ['continuous'] },
  },
  'runway.eitherWay': {
    name: 'Either way about',
    meaning: 'Whether a crane’s wheels may stand either way about on the rail.',
    entry: flag,
    default: { entry: true, source: 'on the safe side' },
  },
  'runway.checkSpan': {
    name: 'Span checked',
    meaning: 'Index of the one span that is reported, from 0.',
    entry: { is: 'number', whole: true, from: 0, to: 99 },
    default: { text: 'each check reports its worst span', source: 'on the safe side' },
  },
  'runway.overhangs': {
    name: 'Overhangs',
    meaning: 'Beyond the first and the last support.',
    entry: { is: 'list', of: distance, least: 2, most: 2 },
    notCovered: 'all',
  },
  'runway.settlements': {
    name: 'Settlements',
    meaning: 'Of each support, downward positive.',
    entry: { is: 'list', of: { is: 'quantity', kind: 'length', from: '-1 m', to: '1 m' }, least: 2, most: 101 },
    notCovered: 'all',
  },
  'runway.springs': {
    name: 'Springs',
    meaning: 'Stiffness of each support, as force per length.',
    entry: {
      is: 'list',
      of: { is: 'quantity', kind: 'lineLoad', above: '0 kN/m', to: '1e12 kN/m' },
      least: 2,
      most: 101,
    },
    notCovered: 'all',
  },
  'runway.unbracedLength': {
    name: 'Unbraced length, top flange',
    meaning: 'Between points where the top flange is held sideways.',
    entry: { is: 'quantity', kind: 'distance', from: '0.01 m', to: '100 m' },
    default: { text: 'the span', source: 'held at the supports only' },
    source: 'AISC 360-22 F1',
  },
  'runway.unbracedLengthBottom': {
    name: 'Unbraced length, bottom flange',
    meaning: 'Between points where the bottom flange is held sideways.',
    entry: { is: 'quantity', kind: 'distance', from: '0.01 m', to: '100 m' },
    default: { text: 'the span', source: 'held at the supports only' },
    source: 'AISC 360-22 F1',
  },
  'runway.topFlangeRestraint': {
    name: 'Restraint of the top flange',
    meaning: 'Whether a surge girder holds the top flange; its section stands in girder.surge.',
    entry: { is: 'choice', of: ['none', 'surge-girder'] },
    default: { entry: 'none', source: 'the girder takes side thrust by itself' },
    notCovered: { values: ['surge-girder'] },
  },
  'runway.rail': {
    name: 'Rail',
    meaning: 'By its name in the catalogue, or by its dimensions.',
    entry: {
      is: 'object',
      ways: [{ needs: ['name'] }, { needs: ['height', 'headWidth', 'footWidth', 'mass'], may: ['ix'] }],
    },
    required: true,
  },
  'runway.rail.name': {
    name: 'Name of the rail',
    meaning: 'As the catalogue has it.',
    entry: { is: 'lookUp', family: 'rail' },
  },
  'runway.rail.height': { name: 'Height', meaning: 'As rolled.', entry: { ...dimension, to: '500 mm' } },
  'runway.rail.headWidth': { name: 'Width of the head', meaning: 'As rolled.', entry: { ...dimension, to: '500 mm' } },
  'runway.rail.footWidth': { name: 'Width of the foot', meaning: 'As rolled.', entry: { ...dimension, to: '1 m' } },
  'runway.rail.mass': {
    name: 'Mass per length',
    meaning: 'US rails are named in pounds a yard.',
    entry: { is: 'quantity', kind: 'lineMass', from: '0.1 kg/m', to: '1000 kg/m' },
  },
  'runway.rail.ix': {
    name: 'Moment of inertia',
    meaning: 'About the horizontal axis.',
    entry: { is: 'quantity', kind: 'inertia', from: '1 mm4', to: '1e10 mm4' },
  },
  'runway.rail.fixing': {
    name: 'Fixing',
    meaning: 'Rail on clips, or welded to the girder and acting with it.',
    entry: { is: 'choice', of: ['clips', 'welded'] },
    default: { entry: 'clips', source: 'common practice' },
    notCovered: { values: ['welded'] },
  },
  'runway.rail.wear': {
    name: 'Wear',
    meaning: 'Height lost from the head.',
    entry: { is: 'quantity', kind: 'length', from: '0 mm', to: '200 mm' },
    default: { entry: '0 mm', source: 'a new rail' },
  },
  'runway.rail.pad': {
    name: 'Elastic pad',
    meaning: 'Whether an elastic pad lies under the rail.',
    entry: flag,
    default: { entry: false, source: 'common practice' },
    notCovered: { unless: false },
  },
  'runway.rail.eccentricity': {
    name: 'Eccentricity of the rail',
    meaning: 'From the middle of the web.',
    entry: { is: 'quantity', kind: 'length', from: '0 mm', to: '500 mm' },
    default: { text: '3/4 of the web’s thickness', source: 'AIST TR-13 (2021) 5.17.6' },
  },
  'runway.bearingLength': {
    name: 'Length of bearing',
    meaning: 'Of the girder on its support, along the span. Left out, the checks that need it are not covered.',
    entry: { is: 'quantity', kind: 'length', from: '1 mm', to: '5 m' },
  },
  'runway.bracketEccentricity': {
    name: 'Eccentricity on the bracket',
    meaning:
      'From the face of the column to the middle of the girder: turns the bracket reaction that is handed on into a moment.',
    entry: detail,
  },
  'runway.endDistance': {
    name: 'End distance',
    meaning:
      'From the centre of the bearing to the end of the girder. Left out, the checks that need it are not covered.',
    entry: detail,
  },
  'runway.stop': { name: 'Stop', meaning: 'End stop and bumper.', entry: object, notCovered: 'all' },
  'runway.stop.bumperStroke': {
    name: 'Stroke of the bumper',
    meaning: 'Travel from touch to full compression.',
    entry: dimension,
    required: true,
    notCovered: 'all',
  },
  'runway.stop.bumperEfficiency': {
    name: 'Efficiency of the bumper',
    meaning: '0.5 for springs.',
    entry: share,
    default: { text: '0.5', source: 'AISC Design Guide 7 (from memory)' },
    notCovered: 'all',
  },
  'runway.stop.height': {
    name: 'Height of the bumper',
    meaning: 'Above the top of the girder.',
    entry: detail,
    notCovered: 'all',
  },
  'runway.stop.speedFraction': {
    name: 'Part of the travel speed',
    meaning: 'With which the crane meets the stop.',
    entry: share,
    default: { text: '0.5', source: 'AIST TR-13 (from memory)' },
    notCovered: 'all',
  },
} as const satisfies Record<string, Field>
