/** Readers of PDF that a machine may have; where it has not, what they would find is not looked at, and that is said. */
import { execFileSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'

type Tool = keyof typeof VERSION

const VERSION = { qpdf: '--version', pdftotext: '-v' } as const

export function has(tool: Tool): boolean {
  try {
    execFileSync(tool, [VERSION[tool]], { stdio: 'ignore' })
    return true
  } catch {
    console.log(`${tool} is not on this machine: what it would find was not looked at`)
    return false
  }
}

/** What a reader prints about a file. */
export const told = (tool: Tool, bytes: Uint8Array): string => {
  const folder = mkdtempSync(join(tmpdir(), 'longtravel-print-'))
  try {
    const path = join(folder, 'sheet.pdf')
    writeFileSync(path, bytes)
    return execFileSync(tool, tool === 'qpdf' ? ['--check', path] : [path, '-'], {
      encoding: 'utf8',
      maxBuffer: 2 ** 26,
    })
  } finally {
    rmSync(folder, { recursive: true })
  }
}
