/** Short forms of the entries that recur in the dictionary, with the wide limits that hold for all of their kind. */

/** A dimension of a section or detail. */
export const dimension = { is: 'quantity', kind: 'length', from: '1 mm', to: '10 m' } as const

/** A thickness of a plate, a web or a flange. */
export const thickness = { is: 'quantity', kind: 'length', from: '0.5 mm', to: '500 mm' } as const

/** A distance along or across the building that may be nothing. */
export const distance = { is: 'quantity', kind: 'distance', from: '0 m', to: '100 m' } as const

/** A weight, given as force or as mass, that may be nothing. */
export const weight = { is: 'quantity', kind: 'forceOrMass', from: '0 kN', to: '20 MN' } as const

/** A load that is there. */
export const load = { is: 'quantity', kind: 'forceOrMass', from: '1 N', to: '20 MN' } as const

/** A load per length of girder. */
export const lineLoad = { is: 'quantity', kind: 'lineLoad', from: '0 kN/m', to: '1000 kN/m' } as const

export const strength = { is: 'quantity', kind: 'stress', from: '50 MPa', to: '2000 MPa' } as const

export const share = { is: 'number', from: 0, to: 1 } as const

export const object = { is: 'object' } as const

export const flag = { is: 'flag' } as const

/** One or several lines of text. */
export const text = { is: 'text', most: 500 } as const
