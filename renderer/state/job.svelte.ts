/** The job as it is being written. Every change makes a new tree; what was typed is kept as it was typed. */
import { SvelteMap } from 'svelte/reactivity'
import { MOST } from '../../core/contract/texts.ts'
import { FIELDS } from '../../core/job/fields.ts'
import type { Field } from '../../core/job/field.ts'
import { parseJson, type Json, type JsonObject } from '../../core/job/json.ts'
import type { Finding } from '../../core/job/read.ts'
import { JOB_VERSION, upgradeJob } from '../../core/job/upgrade.ts'
import { isObject } from '../../core/job/walk.ts'
import type { UnitSystem } from '../../core/quantity/kinds.ts'
import { patternOf, valueAt, withValue, without } from './tree.ts'
import { lineOf, storedOf } from './typed.ts'
import type { JobState } from './types.ts'
import { turned, wayIn } from './ways.ts'

/** The deepest path of the dictionary has 6 levels. */
const DEEPEST = 32

/** Steels that belong to a part of the section: without the part they are laid aside with it. */
const STEEL_OF = { 'girder.section.cap': ['girder.capSteel'], 'girder.section': ['girder.plateSteel'] } as const

export class Job implements JobState {
  #tree = $state.raw<JsonObject>(blank('us'))
  #text = $derived(JSON.stringify(this.#tree, undefined, 2))
  #findings = $state.raw<ReadonlyMap<string, Finding>>(new SvelteMap())
  /** Forms chosen by hand, for parts in which nothing is entered yet that would tell. */
  #turned = $state<Record<string, string>>({})
  /** What a part held in a form that was left: "path word" -> its value. */
  #aside: Record<string, Json | undefined> = {}
  /** What was typed where the file holds it in another shape, and the value it was read to. */
  #typed: Record<string, { readonly text: string; readonly stored: Json } | undefined> = {}

  constructor(text?: string) {
    const why = text === undefined ? undefined : this.open(text)
    if (why !== undefined) throw new Error(why)
  }

  get text(): string {
    return this.#text
  }

  get findings(): ReadonlyMap<string, Finding> {
    return this.#findings
  }

  get units(): UnitSystem {
    return this.#tree.units === 'si' ? 'si' : 'us'
  }

  get cranes(): number {
    const { cranes } = this.#tree
    return Array.isArray(cranes) ? cranes.length : 0
  }

  entry(path: string): string | undefined {
    const stored = valueAt(this.#tree, path)
    const typed = this.#typed[path]
    return typed !== undefined && typed.stored === stored ? typed.text : lineOf(stored)
  }

  has(path: string): boolean {
    return valueAt(this.#tree, path) !== undefined
  }

  enter(path: string, typed: string): void {
    if (typed.trim() === '') {
      this.#tree = withValue(this.#tree, path, undefined)
      return
    }
    const entry = fieldAt(path)?.entry
    if (entry === undefined) throw new Error(`The dictionary has no field ${path}`)
    const stored = storedOf(entry, typed, this.units)
    this.#tree = withValue(this.#tree, path, stored)
    // Where a bare number took a unit, what is stored is shown: the figure alone would change its meaning with the units shown.
    const inOtherUnits = storedOf(entry, typed, this.units === 'us' ? 'si' : 'us')
    this.#typed[path] = JSON.stringify(stored) === JSON.stringify(inOtherUnits) ? { text: typed, stored } : undefined
  }

  setUnits(units: UnitSystem): void {
    this.#tree = withValue(this.#tree, 'units', units)
  }

  /** One more crane with the entries of the last, since most runways carry cranes alike; its name is left to the default. */
  addCrane(): void {
    const last = valueAt(this.#tree, `cranes[${this.cranes - 1}]`)
    const entries = isObject(last) ? without(last, 'name') : {}
    this.#tree = { ...this.#tree, cranes: [...this.#list('cranes'), entries] }
  }

  removeCrane(index: number): void {
    this.#tree = { ...this.#tree, cranes: this.#list('cranes').filter((_, each) => each !== index) }
  }

  way(path: string): string {
    return this.#turned[path] ?? wayIn(this.#tree, path)
  }

  turn(path: string, word: string): void {
    const was = this.way(path)
    if (was === word) return
    this.#layAside(path, was)
    this.#tree = turned(this.#tree, path, word, this.#aside[`${path} ${word}`])
    this.#turned[path] = word
    for (const steel of path in STEEL_OF ? STEEL_OF[path as keyof typeof STEEL_OF] : [])
      if (word === 'none' || word === 'rolled') this.turn(steel, 'none')
  }

  open(text: string): string | undefined {
    if (text.length > MOST.job) return `The file has ${text.length} characters; a job file has at most ${MOST.job}.`
    const parsed = parseJson(text, DEEPEST)
    if (!parsed.ok) return `This is no job file: ${parsed.message}. Read there: ${parsed.read}.`
    if (!isObject(parsed.value)) return 'This is no job file: it holds no object, between { and }.'
    const { format, version } = parsed.value
    if (format !== 'longtravel-job') return 'This is no job file: its format is not "longtravel-job".'
    if (typeof version !== 'number' || !Number.isInteger(version) || version < 1)
      return 'This is no job file: its version is missing.'
    if (version > JOB_VERSION)
      return `This job was written by a newer program: version ${version}, this one reads ${JOB_VERSION}.`
    if (parsed.repeated.length > 0)
      return `In this file ${parsed.repeated.join(', ')} is given twice; leave one of them out and open it again.`
    this.#tree = upgradeJob(parsed.value, version)
    this.#findings = new SvelteMap()
    this.#turned = {}
    this.#aside = {}
    this.#typed = {}
    return undefined
  }

  /** What the review found wrong in a text that this job had. */
  take(findings: readonly Finding[]): void {
    this.#findings = new SvelteMap(findings.map((finding) => [finding.path, finding]))
  }

  #layAside(path: string, word: string): void {
    this.#aside[`${path} ${word}`] = valueAt(this.#tree, path)
  }

  #list(path: string): readonly Json[] {
    const list = valueAt(this.#tree, path)
    return Array.isArray(list) ? (list as readonly Json[]) : []
  }
}

/** A job in which nothing is entered but what every job has. */
export const blankJob = (units: UnitSystem): string => JSON.stringify(blank(units))

/** What the dictionary says of a path of the file; undefined where it has no such field. */
const fieldAt = (path: string): Field | undefined => {
  const pattern = patternOf(path)
  return Object.hasOwn(FIELDS, pattern) ? FIELDS[pattern as keyof typeof FIELDS] : undefined
}

function blank(units: UnitSystem): JsonObject {
  return {
    format: 'longtravel-job',
    version: JOB_VERSION,
    project: {},
    units,
    basis: { standard: 'us' },
    cranes: [{}],
    runway: {},
    girder: { section: { kind: 'rolled' } },
  }
}
