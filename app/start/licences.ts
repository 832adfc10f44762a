/** The licences of all that a bundle holds, beside it: made from the bundle itself, so that no package is left out. */
import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import type { Plugin } from 'vite'

/** Names every package whose modules are in the bundle, with its version, its licence and the text of it. */
export const licences: Plugin = {
  name: 'licences',
  generateBundle(_options, bundle) {
    const folders = new Set(
      Object.values(bundle).flatMap((part) => (part.type === 'chunk' ? part.moduleIds.flatMap(packageOf) : [])),
    )
    const source = [...folders].sort().map(entryOf).join('\n\n')
    this.emitFile({ type: 'asset', fileName: 'licences.txt', source: `${source}\n` })
  },
}

/** The folder of the package that a module belongs to; none for the program's own and for what the builder adds. */
const packageOf = (id: string): readonly string[] => {
  const folder = /^\0?(.*[\\/]node_modules[\\/](?:@[^\\/]+[\\/])?[^\\/]+)[\\/]/.exec(id)?.[1]
  return folder === undefined ? [] : [folder]
}

interface Manifest {
  readonly name: string
  readonly version: string
  readonly license?: string
}

const entryOf = (folder: string): string => {
  const { name, version, license } = JSON.parse(readFileSync(join(folder, 'package.json'), 'utf8')) as Manifest
  const texts = readdirSync(folder).filter((file) => /^(?:licen[cs]e|copying|notice)/i.test(file))
  const head = `${name} ${version}: ${license ?? 'see the text'}`
  return [head, ...texts.map((file) => readFileSync(join(folder, file), 'utf8').trim())].join('\n\n')
}
