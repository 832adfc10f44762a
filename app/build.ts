/** Builds the program into out/, all targets of electron.config.ts: `npm run build`. */
import { build } from 'vite'
import { targets } from '../electron.config.ts'
import { markBuilt } from './start/stale.ts'

for (const target of targets) await build(target)
markBuilt()
