/** The views that the head names. */
export type View = 'girder' | 'revisions'
