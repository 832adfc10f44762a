/** The cranes, as their data sheets describe them, in the order they stand on the rail. */
import type { Field } from '../field.ts'
import { distance, flag, load, object, share, weight } from './entries.ts'

const drive = { is: 'choice', of: ['powered', 'hand'] } as const
const byOperation = { text: 'powered; hand where operation is hand', source: 'common practice' } as const
const derive = { is: 'choice', of: ['derive'] } as const
const speed = { is: 'quantity', kind: 'speed', from: '0 m/s', to: '20 m/s' } as const

export const CRANES = {
  cranes: {
    name: 'Cranes',
    meaning: 'In the order they stand on the rail.',
    entry: { is: 'list', of: object, least: 1, most: 10 },
    required: true,
  },
  'cranes[].name': {
    name: 'Name',
    meaning: 'How the crane is called; no two have the same name.',
    entry: { is: 'text', most: 100 },
    default: { text: 'Crane and its number', source: 'in the order entered' },
  },
  'cranes[].ratedCapacity': {
    name: 'Rated capacity',
    meaning: 'The load the crane is rated to lift.',
    entry: load,
    required: true,
  },
  'cranes[].bridgeWeight': {
    name: 'Weight of the bridge',
    meaning: 'Bridge with end trucks, without trolley.',
    entry: weight,
    required: 'where any of the three wheel loads is derived',
  },
  'cranes[].trolleyWeight': {
    name: 'Weight of the trolley',
    meaning: 'Trolley with hoist.',
    entry: weight,
    required: 'where any of the three wheel loads is derived, or the trolley is powered (side thrust)',
  },
  'cranes[].belowHook': {
    name: 'Lifting gear below the hook',
    meaning: 'Weight of what is lifted beside the rated load: magnet, spreader, tongs.',
    entry: weight,
    default: { entry: '0 kN', source: 'nothing hangs below the hook but the rated load' },
  },
  'cranes[].bridgeSpan': {
    name: 'Span of the bridge',
    meaning: 'From rail to rail.',
    entry: { is: 'quantity', kind: 'distance', from: '1 m', to: '100 m' },
    required: true,
  },
  'cranes[].hookApproach': {
    name: 'Hook approach',
    meaning: 'Least distance from the hook to this rail.',
    entry: distance,
    default: { entry: '0 m', source: 'on the safe side: the hook above the rail' },
  },
  'cranes[].hookApproachFar': {
    name: 'Hook approach, far rail',
    meaning: 'Least distance from the hook to the other rail.',
    entry: distance,
    default: { text: 'the same as to this rail', source: 'a trolley that reaches both sides alike' },
  },
  'cranes[].operation': {
    name: 'Operation',
    meaning: 'From where the crane is driven: cab, remote control, pendant, or by hand chain.',
    entry: { is: 'choice', of: ['cab', 'remote', 'pendant', 'hand'] },
    required: true,
    source: 'ASCE 7-22 4.9.3',
  },
  'cranes[].bridgeDrive': {
    name: 'Bridge drive',
    meaning: 'Powered or hand-geared.',
    entry: drive,
    default: byOperation,
  },
  'cranes[].trolleyDrive': {
    name: 'Trolley drive',
    meaning: 'Powered or hand-geared.',
    entry: drive,
    default: byOperation,
  },
  'cranes[].hoistDrive': {
    name: 'Hoist drive',
    meaning: 'Powered or hand-geared.',
    entry: drive,
    default: byOperation,
  },
  'cranes[].millKind': {
    name: 'Kind of mill crane',
    meaning: 'A row of the mill rule’s table; mill rule only.',
    entry: { is: 'text', most: 100 },
    source: 'AIST TR-13 (2021) Table 3.2',
    notCovered: 'all',
  },
  'cranes[].serviceClass': {
    name: 'Service class',
    meaning: 'A standby, B light, C moderate, D heavy, E severe, F continuous severe.',
    entry: { is: 'choice', of: ['A', 'B', 'C', 'D', 'E', 'F'] },
    required: true,
    source: 'CMAA 70',
  },
  'cranes[].wheelSpacings': {
    name: 'Wheel spacings',
    meaning: 'From wheel to wheel on this rail: n - 1 values for n wheels, none for a single wheel.',
    entry: {
      is: 'list',
      of: { is: 'quantity', kind: 'distance', from: '1 mm', to: '100 m' },
      least: 0,
      most: 31,
    },
    required: true,
  },
  'cranes[].wheelLoad': {
    name: 'Wheel loads',
    meaning:
      'Static, with the rated load and the trolley at least approach, without impact and without the crane’s own design ' +
      'factors: one value for all wheels, a list with a value a wheel, or "derive" from the weights. Given loads win over the weights.',
    entry: { is: 'either', of: [derive, load, { is: 'list', of: load, least: 1, most: 32 }] },
    default: {
      entry: 'derive',
      source: 'ASCE 7-22 4.9.2: bridge, rated capacity and trolley where the effect is greatest',
    },
  },
  'cranes[].leastWheelLoad': {
    name: 'Least wheel loads',
    meaning: 'The same with the trolley at the far rail.',
    entry: { is: 'either', of: [derive, weight, { is: 'list', of: weight, least: 1, most: 32 }] },
    default: { entry: 'derive', source: 'from the weights, trolley at the far rail' },
  },
  'cranes[].emptyWheelLoad': {
    name: 'Empty wheel loads',
    meaning: 'The same without load on the hook.',
    entry: { is: 'either', of: [derive, weight, { is: 'list', of: weight, least: 1, most: 32 }] },
    default: { entry: 'derive', source: 'from the weights, nothing on the hook' },
  },
  'cranes[].drivenWheels': {
    name: 'Driven wheels',
    meaning: 'Number of wheels on this rail that are driven.',
    entry: { is: 'number', whole: true, from: 0, to: 32 },
    default: { text: 'all', source: 'ASCE 7-22 4.9.5 counts every wheel' },
    notCovered: { text: 'any number but that of all wheels' },
  },
  'cranes[].rigidGuided': {
    name: 'Rigidly guided load',
    meaning: 'Whether the bridge guides the load (force on the stops).',
    entry: flag,
    default: { entry: false, source: 'common practice: the load hangs on ropes' },
    notCovered: { unless: false },
  },
  'cranes[].bumperOverhang': {
    name: 'Bumper overhang',
    meaning:
      'From the outer wheels to the bumper faces, at the first and at the last wheel; sets the least gap between two cranes.',
    entry: {
      is: 'list',
      of: { is: 'quantity', kind: 'distance', from: '0 m', to: '20 m' },
      least: 2,
      most: 2,
    },
    default: { entry: ['0.6 m', '0.6 m'], source: 'common practice; the data sheet of the crane decides' },
  },
  'cranes[].travelSpeed': {
    name: 'Travel speed',
    meaning: 'Of the bridge, with rated load.',
    entry: speed,
    notCovered: 'all',
  },
  'cranes[].hoistSpeed': { name: 'Hoist speed', meaning: 'With rated load.', entry: speed, notCovered: 'all' },
  'cranes[].liftsPerDay': {
    name: 'Lifts a day',
    meaning: 'For fatigue.',
    entry: { is: 'number', from: 0, to: 100_000 },
    notCovered: 'all',
  },
  'cranes[].years': {
    name: 'Years',
    meaning: 'Life of the runway, for fatigue.',
    entry: { is: 'number', above: 0, to: 200 },
    default: { text: '50', source: 'AIST TR-13 (2021) 1.4' },
    notCovered: 'all',
  },
  'cranes[].totalLifts': {
    name: 'Lifts in all',
    meaning: 'For fatigue, instead of lifts a day and years.',
    entry: { is: 'number', from: 0, to: 1_000_000_000 },
    default: { text: 'by service class', source: 'CMAA 70 (from memory)' },
    notCovered: 'all',
  },
  'cranes[].liftSpectrum': {
    name: 'Spectrum of lifts',
    meaning: 'Which share of the lifts carries which part of the rated load.',
    entry: { is: 'list', of: object, least: 1, most: 50 },
    default: { text: 'every lift at rated load', source: 'on the safe side' },
    notCovered: 'all',
  },
  'cranes[].liftSpectrum[].share': {
    name: 'Share',
    meaning: 'Part of the lifts.',
    entry: share,
    required: true,
    notCovered: 'all',
  },
  'cranes[].liftSpectrum[].load': {
    name: 'Load',
    meaning: 'Part of the rated load.',
    entry: share,
    required: true,
    notCovered: 'all',
  },
} as const satisfies Record<string, Field>
