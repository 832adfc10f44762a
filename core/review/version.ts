/** The program's version, as package.json has it; it stands on every result. */
export const VERSION = '0.1.0'
