/** The Electron shell. Nothing is awaited here: Electron is ready only after this file has run to its end. */
import { start } from './shell/shell.ts'

void start()
