/** Readers of PDF that a machine may have; where it has not, what they would find is not looked at, and that is said. */
import { execFileSync } from 'node:child_process'

const VERSION = { qpdf: '--version', pdftotext: '-v' } as const

export function has(tool: keyof typeof VERSION): boolean {
  try {
    execFileSync(tool, [VERSION[tool]], { stdio: 'ignore' })
    return true
  } catch {
    console.log(`${tool} is not on this machine: what it would find was not looked at`)
    return false
  }
}
