/**
 * The kinds of quantity a runway girder needs, their dimensions and their branded types.
 * Everything inside core is SI (m, kg, s, N, Pa, rad); a brand keeps a force from being passed as a length.
 */

declare const unit: unique symbol
type Branded<Unit extends string> = number & { readonly [unit]: Unit }

export type Ratio = number
export type Metre = Branded<'m'>
export type SquareMetre = Branded<'m2'>
export type CubicMetre = Branded<'m3'>
export type Metre4 = Branded<'m4'>
export type Metre6 = Branded<'m6'>
export type Newton = Branded<'N'>
export type NewtonMetre = Branded<'N m'>
export type Pascal = Branded<'Pa'>
export type NewtonPerMetre = Branded<'N/m'>
export type Kilogram = Branded<'kg'>
export type KilogramPerMetre = Branded<'kg/m'>
export type MetrePerSecond = Branded<'m/s'>
export type NewtonSquareMetre = Branded<'N m2'>

/** Exponents of kilogram, metre and second. */
export type Dimension = readonly [kg: number, m: number, s: number]

/**
 * Kind of quantity -> dimension. `length` is a dimension of a section (shown in inches or millimetres),
 * `distance` one along or across the building (feet or metres); both are metres inside.
 */
export const DIMENSIONS = {
  ratio: [0, 0, 0],
  length: [0, 1, 0],
  distance: [0, 1, 0],
  area: [0, 2, 0],
  modulus: [0, 3, 0],
  inertia: [0, 4, 0],
  warping: [0, 6, 0],
  force: [1, 1, -2],
  moment: [1, 2, -2],
  stress: [1, -1, -2],
  lineLoad: [1, 0, -2],
  mass: [1, 0, 0],
  lineMass: [1, -1, 0],
  speed: [0, 1, -1],
  flexuralStiffness: [1, 3, -2],
} as const satisfies Record<string, Dimension>

export type Kind = keyof typeof DIMENSIONS

/** The branded type that holds a value of each kind. */
export interface KindValue {
  ratio: Ratio
  length: Metre
  distance: Metre
  area: SquareMetre
  modulus: CubicMetre
  inertia: Metre4
  warping: Metre6
  force: Newton
  moment: NewtonMetre
  stress: Pascal
  lineLoad: NewtonPerMetre
  mass: Kilogram
  lineMass: KilogramPerMetre
  speed: MetrePerSecond
  flexuralStiffness: NewtonSquareMetre
}

/** A value with its kind, as it travels to screens and sheets. */
export interface Quantity<K extends Kind = Kind> {
  readonly kind: K
  readonly value: KindValue[K]
}

export type UnitSystem = 'us' | 'si'

/** Marks a plain SI number as a quantity of the given kind; the only place where a brand is put on by hand. */
export const as = <K extends Kind>(_kind: K, si: number): KindValue[K] => si as KindValue[K]

/** Standard acceleration of free fall, m/s2 (3rd CGPM, 1901): weight of a mass, by definition of the units in use. */
export const STANDARD_GRAVITY = 9.80665
