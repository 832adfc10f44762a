/** Welds, stiffeners, holes and added loads of the girder. */
import type { Field } from '../field.ts'
import { dimension, distance, lineLoad, object, thickness } from './entries.ts'

const none = { text: 'none', source: 'nothing entered' } as const
const weldType = {
  name: 'Kind of weld',
  meaning: 'Fillet, or groove with complete or partial penetration.',
  entry: { is: 'choice', of: ['fillet', 'CJP', 'PJP'] },
  notCovered: 'all',
} as const
const weldSize = {
  name: 'Size',
  meaning: 'Leg of a fillet, throat of a groove weld.',
  entry: dimension,
  notCovered: 'all',
} as const
const electrode = {
  name: 'Electrode',
  meaning: 'Classification, such as E70.',
  entry: { is: 'text', most: 50 },
  notCovered: 'all',
} as const
const stiffenerWidth = {
  name: 'Width',
  meaning: 'Of each plate.',
  entry: dimension,
  required: true,
  notCovered: 'all',
} as const
const stiffenerThickness = {
  name: 'Thickness',
  meaning: 'Of each plate.',
  entry: thickness,
  required: true,
  notCovered: 'all',
} as const

export const DETAILS = {
  'girder.welds': {
    name: 'Welds',
    meaning: 'Between web and flanges, and of the cap.',
    entry: object,
    default: { text: 'least size', source: 'AISC 360-22 J2.4' },
    notCovered: 'all',
  },
  'girder.welds.webTop': { name: 'Web to top flange', meaning: 'Along the girder.', entry: object, notCovered: 'all' },
  'girder.welds.webTop.type': weldType,
  'girder.welds.webTop.size': weldSize,
  'girder.welds.webTop.electrode': electrode,
  'girder.welds.webBottom': {
    name: 'Web to bottom flange',
    meaning: 'Along the girder.',
    entry: object,
    notCovered: 'all',
  },
  'girder.welds.webBottom.type': weldType,
  'girder.welds.webBottom.size': weldSize,
  'girder.welds.webBottom.electrode': electrode,
  'girder.welds.cap': { name: 'Cap to top flange', meaning: 'Along the girder.', entry: object, notCovered: 'all' },
  'girder.welds.cap.type': weldType,
  'girder.welds.cap.size': weldSize,
  'girder.welds.cap.electrode': electrode,
  'girder.stiffeners': {
    name: 'Stiffeners',
    meaning: 'Between the supports and at them.',
    entry: object,
    default: none,
    notCovered: 'all',
  },
  'girder.stiffeners.spacing': {
    name: 'Spacing',
    meaning: 'From stiffener to stiffener.',
    entry: distance,
    notCovered: 'all',
  },
  'girder.stiffeners.intermediate': {
    name: 'Intermediate stiffeners',
    meaning: 'A pair of plates.',
    entry: object,
    notCovered: 'all',
  },
  'girder.stiffeners.intermediate.width': stiffenerWidth,
  'girder.stiffeners.intermediate.thickness': stiffenerThickness,
  'girder.stiffeners.bearing': {
    name: 'Bearing stiffeners',
    meaning: 'A pair of plates.',
    entry: object,
    notCovered: 'all',
  },
  'girder.stiffeners.bearing.width': stiffenerWidth,
  'girder.stiffeners.bearing.thickness': stiffenerThickness,
  'girder.holes': {
    name: 'Holes',
    meaning: 'In the flanges.',
    entry: { is: 'list', of: object, least: 0, most: 50 },
    default: none,
    notCovered: { unless: [] },
  },
  'girder.holes[].flange': {
    name: 'Flange',
    meaning: 'In which the holes are.',
    entry: { is: 'choice', of: ['top', 'bottom'] },
    required: true,
    notCovered: 'all',
  },
  'girder.holes[].diameter': {
    name: 'Diameter',
    meaning: 'Of the hole.',
    entry: dimension,
    required: true,
    notCovered: 'all',
  },
  'girder.holes[].count': {
    name: 'Count',
    meaning: 'Holes in one cross-section.',
    entry: { is: 'number', whole: true, from: 1, to: 20 },
    required: true,
    notCovered: 'all',
  },
  'girder.surge': {
    name: 'Surge girder',
    meaning: 'Section of the girder that holds the top flange sideways.',
    entry: object,
    notCovered: 'all',
  },
  'girder.addedDeadLoad': {
    name: 'Added dead load',
    meaning: 'Walkway, conductors. The girder’s own weight and the rail’s come by themselves.',
    entry: lineLoad,
    default: { entry: '0 kN/m', source: 'nothing entered' },
  },
  'girder.addedLiveLoad': {
    name: 'Added live load',
    meaning: 'On a walkway.',
    entry: lineLoad,
    default: { entry: '0 kN/m', source: 'nothing entered' },
  },
  'girder.addedAxial': {
    name: 'Added axial force',
    meaning: 'From wind, earthquake or temperature, found elsewhere.',
    entry: { is: 'quantity', kind: 'force', from: '-100 MN', to: '100 MN' },
    default: { entry: '0 kN', source: 'nothing entered' },
    notCovered: { unless: 0 },
  },
  'girder.fatigueDetails': {
    name: 'Fatigue details',
    meaning: 'Beside those the make-up itself has.',
    entry: { is: 'list', of: object, least: 1, most: 50 },
    default: { text: 'those the make-up itself has', source: 'AISC 360-22 Table A-3.1' },
    notCovered: 'all',
  },
  'girder.fatigueDetails[].detail': {
    name: 'Detail',
    meaning: 'Case of the table.',
    entry: { is: 'text', most: 100 },
    required: true,
    source: 'AISC 360-22 Table A-3.1',
    notCovered: 'all',
  },
  'girder.fatigueDetails[].at': {
    name: 'Station',
    meaning: 'Where it is.',
    entry: distance,
    required: true,
    notCovered: 'all',
  },
  'girder.fatigueDetails[].category': {
    name: 'Category',
    meaning: 'Stress category, where not that of the case.',
    entry: { is: 'choice', of: ['A', 'B', "B'", 'C', 'D', 'E', "E'", 'F'] },
    source: 'AISC 360-22 appendix 3',
    notCovered: 'all',
  },
} as const satisfies Record<string, Field>
