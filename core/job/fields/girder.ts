/** The girder's steel and make-up. */
import type { Family, Field } from '../field.ts'
import { dimension, object, strength, thickness } from './entries.ts'

const lookUp = <F extends Family>(family: F) => ({ is: 'lookUp', family }) as const

const steelWays = { is: 'object', ways: [{ needs: ['name'] }, { needs: ['fy', 'fu'] }] } as const
const steel = (name: string, meaning: string) => ({ name, meaning, entry: steelWays }) as const
const steelName = { name: 'Name of the steel', meaning: 'As the catalogue has it.', entry: lookUp('steel') } as const
const fy = { name: 'Yield stress', meaning: 'Specified minimum.', entry: strength } as const
const fu = {
  name: 'Tensile strength',
  meaning: 'Specified minimum, not below the yield stress.',
  entry: strength,
} as const
const E = {
  name: 'Modulus of elasticity',
  meaning: 'Of the steel.',
  entry: { is: 'quantity', kind: 'stress', from: '50 GPa', to: '500 GPa' },
  default: { entry: '29000 ksi', source: 'AISC 360-22, list of symbols' },
} as const

const width = (name: string) => ({ name, meaning: 'Width of the plate.', entry: dimension, required: true }) as const
const plateThickness = {
  name: 'Thickness',
  meaning: 'Thickness of the plate.',
  entry: thickness,
  required: true,
} as const

const figure = <K extends 'area' | 'inertia' | 'modulus' | 'warping' | 'length' | 'lineMass'>(
  kind: K,
  from: string,
  to: string,
  name: string,
) =>
  ({
    name,
    meaning: 'Handbook figure; taken instead of the one computed from the dimensions.',
    entry: { is: 'quantity', kind, from, to },
  }) as const

const none = { text: 'none', source: 'nothing entered' } as const

export const GIRDER = {
  girder: { name: 'Girder', meaning: 'Make-up, steel, added loads.', entry: object, required: true },
  'girder.steel': { ...steel('Steel', 'Of all parts unless another is given for cap or plates.'), required: true },
  'girder.steel.name': steelName,
  'girder.steel.fy': fy,
  'girder.steel.fu': fu,
  'girder.steel.E': E,
  'girder.capSteel': {
    ...steel('Steel of the cap', 'Only where there is a cap.'),
    default: { text: 'the girder’s steel', source: 'one steel throughout' },
  },
  'girder.capSteel.name': steelName,
  'girder.capSteel.fy': fy,
  'girder.capSteel.fu': fu,
  'girder.capSteel.E': E,
  'girder.plateSteel': {
    ...steel(
      'Steel of the plates',
      'Only where there are plates: those of a welded girder, and a cap plate without a steel of its own.',
    ),
    default: { text: 'the girder’s steel', source: 'one steel throughout' },
  },
  'girder.plateSteel.name': steelName,
  'girder.plateSteel.fy': fy,
  'girder.plateSteel.fu': fu,
  'girder.plateSteel.E': E,
  'girder.section': {
    name: 'Section',
    meaning: 'A rolled shape or a welded girder, with or without a cap on the top flange.',
    entry: {
      is: 'object',
      ways: [
        { kind: 'rolled', needs: ['shape'], may: ['cap'] },
        { kind: 'plated', needs: ['topFlange', 'web', 'bottomFlange'], may: ['cap'] },
      ],
    },
    required: true,
  },
  'girder.section.kind': {
    name: 'Kind',
    meaning: 'A rolled shape, or welded from plates.',
    entry: { is: 'choice', of: ['rolled', 'plated'] },
    required: true,
  },
  'girder.section.shape': {
    name: 'Shape',
    meaning: 'Name in the catalogue, or the dimensions of a shape of one’s own with handbook figures by choice.',
    entry: { is: 'either', of: [lookUp('iShape'), object] },
  },
  'girder.section.shape.d': { name: 'Depth d', meaning: 'Overall.', entry: dimension, required: true },
  'girder.section.shape.bf': { name: 'Flange width bf', meaning: 'Of both flanges.', entry: dimension, required: true },
  'girder.section.shape.tw': { name: 'Web thickness tw', meaning: 'Of the web.', entry: thickness, required: true },
  'girder.section.shape.tf': {
    name: 'Flange thickness tf',
    meaning: 'Of both flanges.',
    entry: thickness,
    required: true,
  },
  'girder.section.shape.r': {
    name: 'Root radius r',
    meaning: 'Between web and flange.',
    entry: { is: 'quantity', kind: 'length', from: '0 mm', to: '200 mm' },
    required: true,
  },
  'girder.section.shape.A': figure('area', '1 mm2', '10 m2', 'Area A'),
  'girder.section.shape.Ix': figure('inertia', '1 mm4', '10 m4', 'Moment of inertia Ix'),
  'girder.section.shape.Sx': figure('modulus', '1 mm3', '10 m3', 'Elastic modulus Sx'),
  'girder.section.shape.Zx': figure('modulus', '1 mm3', '10 m3', 'Plastic modulus Zx'),
  'girder.section.shape.Iy': figure('inertia', '1 mm4', '10 m4', 'Moment of inertia Iy'),
  'girder.section.shape.Sy': figure('modulus', '1 mm3', '10 m3', 'Elastic modulus Sy'),
  'girder.section.shape.Zy': figure('modulus', '1 mm3', '10 m3', 'Plastic modulus Zy'),
  'girder.section.shape.J': figure('inertia', '1 mm4', '10 m4', 'Torsional constant J'),
  'girder.section.shape.Cw': figure('warping', '1 mm6', '10 m6', 'Warping constant Cw'),
  'girder.section.shape.rts': figure('length', '0.1 mm', '10 m', 'Effective radius of gyration rts'),
  'girder.section.shape.ho': figure('length', '0.1 mm', '10 m', 'Distance between flange centroids ho'),
  'girder.section.shape.massPerLength': figure('lineMass', '0.01 kg/m', '100000 kg/m', 'Mass per length'),
  'girder.section.topFlange': { name: 'Top flange', meaning: 'The plate under the rail.', entry: object },
  'girder.section.topFlange.width': width('Width'),
  'girder.section.topFlange.thickness': plateThickness,
  'girder.section.web': { name: 'Web', meaning: 'The plate between the flanges.', entry: object },
  'girder.section.web.depth': { name: 'Depth', meaning: 'Between the flanges.', entry: dimension, required: true },
  'girder.section.web.thickness': plateThickness,
  'girder.section.bottomFlange': { name: 'Bottom flange', meaning: 'The lower plate.', entry: object },
  'girder.section.bottomFlange.width': width('Width'),
  'girder.section.bottomFlange.thickness': plateThickness,
  'girder.section.cap': {
    name: 'Cap',
    meaning: 'On the top flange: a channel, legs down, or a plate.',
    entry: { is: 'object', ways: [{ needs: ['shape'] }, { needs: ['plate'] }] },
    default: none,
  },
  'girder.section.cap.shape': {
    name: 'Channel',
    meaning: 'Name in the catalogue; its legs point down.',
    entry: lookUp('channel'),
  },
  'girder.section.cap.plate': { name: 'Plate', meaning: 'A plate on the top flange.', entry: object },
  'girder.section.cap.plate.width': width('Width'),
  'girder.section.cap.plate.thickness': plateThickness,
} as const satisfies Record<string, Field>
