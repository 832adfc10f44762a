/** A job's entries as a reader of the calculation wants them: by the dictionary's names, what is a default marked as one. */
import { fieldList } from './fields.ts'
import type { Job } from './types.ts'

export interface Echo {
  readonly path: string
  /** The part of the form it stands in: "project", "basis", "cranes[0]", "runway", "girder". */
  readonly group: string
  readonly name: string
  readonly value: string
  readonly isDefault: boolean
  /** Where a default comes from. */
  readonly source?: string
}

/** Every entry and every default taken, in the dictionary's order; the file's own marks (format, version) are left out. */
export const echoOf = (job: Job): readonly Echo[] => {
  const entered = job.entered.map(({ path, value }) => ({ path, value, isDefault: false }))
  const taken = job.defaults.map(({ path, value, source }) => ({ path, value, source, isDefault: true }))
  return [...entered, ...taken]
    .flatMap((entry) => {
      const pattern = entry.path.replace(/\[\d+\]/g, '[]')
      const order = fieldList.findIndex(([path]) => matches(path, pattern))
      const field = fieldList[order]?.[1]
      if (field === undefined || !pattern.includes('.')) return []
      const group = /^[a-z]+(\[\d+\])?/i.exec(entry.path)![0]
      return [{ ...entry, group, name: nameIn(partOf(pattern) + field.name, entry.path, group), order }]
    })
    .sort((a, b) => compare(a.group, b.group) || a.order - b.order || compare(a.path, b.path))
    .map(({ order: _order, ...echo }) => echo)
}

/** Paths of the dictionary stand for any key where they have one in braces. */
const matches = (path: string, pattern: string): boolean =>
  path === pattern ||
  (path.includes('{') && new RegExp(`^${path.replace(/[.[\]]/g, '\\$&').replace(/\{\w+\}/g, '[^.]+')}$`).test(pattern))

/** Width and thickness say nothing without the part they belong to. */
const partOf = (pattern: string): string => {
  const parent = pattern.slice(0, pattern.lastIndexOf('.'))
  const part = parent.split('.').length > 2 ? fieldList.find(([path]) => path === parent)?.[1].name : undefined
  return part === undefined ? '' : `${part}: `
}

/** Items of a list within a group, and keys the user chose, are told apart by their place in the path. */
const nameIn = (name: string, path: string, group: string): string => {
  const within = path.slice(group.length)
  const index = /\[(\d+)\]/.exec(within)?.[1]
  return index === undefined ? name : `${name} (${within.slice(1)})`
}

const GROUPS = ['project', 'units', 'basis', 'cranes', 'runway', 'girder']
const rank = (group: string): number => GROUPS.indexOf(group.replace(/\[\d+\]/, ''))
const compare = (a: string, b: string): number => rank(a) - rank(b) || (a < b ? -1 : a > b ? 1 : 0)
