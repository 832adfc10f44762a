/** What the window knows of the record: projects, their jobs, the revisions of the chosen one. The desk keeps; this only asks. */
import type { Answer, Argument, CallName } from '../../core/contract/calls.ts'
import type {
  JobEntry,
  Numbering,
  Project,
  Revision,
  RevisionStatement,
  RevisionSummary,
} from '../../core/contract/record.ts'
import type { Desk } from '../desk/client.ts'

/** The revision that the data sheet was last kept as or opened from, and the text it had then. */
export interface Held {
  readonly id: number
  readonly label: string
  readonly text: string
}

export class Keeping {
  #projects = $state.raw<readonly Project[]>([])
  #jobs = $state.raw<readonly JobEntry[]>([])
  #revisions = $state.raw<readonly RevisionSummary[]>([])
  #project = $state<number | undefined>()
  #job = $state<number | undefined>()
  #held = $state.raw<Held | undefined>()
  #gone = $state<string | undefined>()
  #refusal = $state<string | undefined>()
  readonly #desk: Pick<Desk, 'call' | 'ended'>

  constructor(desk: Pick<Desk, 'call' | 'ended'>) {
    this.#desk = desk
    void desk.ended.then(({ message }) => {
      this.#gone = message
    })
  }

  get projects(): readonly Project[] {
    return this.#projects
  }
  get jobs(): readonly JobEntry[] {
    return this.#jobs
  }
  get revisions(): readonly RevisionSummary[] {
    return this.#revisions
  }
  get project(): number | undefined {
    return this.#project
  }
  get job(): number | undefined {
    return this.#job
  }
  get held(): Held | undefined {
    return this.#held
  }
  /** Why the desk is out of reach. */
  get gone(): string | undefined {
    return this.#gone
  }
  /** Why the last call was refused. */
  get refusal(): string | undefined {
    return this.#refusal
  }

  async load(): Promise<void> {
    this.#projects = (await this.#ask('projects.list', {})) ?? this.#projects
    if (this.#project !== undefined) await this.chooseProject(this.#project)
  }

  async chooseProject(project: number | undefined): Promise<void> {
    if (project !== this.#project) this.#job = undefined
    this.#project = project
    this.#jobs = project === undefined ? [] : ((await this.#ask('jobs.list', { project })) ?? [])
    await this.chooseJob(this.#job)
  }

  async chooseJob(job: number | undefined): Promise<void> {
    this.#job = job
    this.#revisions = job === undefined ? [] : ((await this.#ask('revisions.list', { job })) ?? [])
  }

  /** Makes a project and chooses it; false where the desk refused. */
  async createProject(name: string, numbering: Numbering): Promise<boolean> {
    const made = await this.#ask('projects.create', { name, numbering })
    if (made === undefined) return false
    this.#project = made.id
    this.#job = undefined
    await this.load()
    return true
  }

  /** Makes a job in the chosen project and chooses it; false where the desk refused. */
  async createJob(name: string): Promise<boolean> {
    const project = this.#project
    const made = project === undefined ? undefined : await this.#ask('jobs.create', { project, name })
    if (made === undefined) return false
    this.#job = made.id
    await this.chooseProject(project)
    return true
  }

  /** Keeps the text as a revision of the chosen job; its label, or undefined where the desk refused. */
  async keep(text: string, statement: RevisionStatement): Promise<string | undefined> {
    const job = this.#job
    const kept = job === undefined ? undefined : await this.#ask('revisions.keep', { job, text, ...statement })
    if (kept === undefined) return undefined
    this.#held = { id: kept.id, label: kept.label, text }
    await this.chooseJob(job)
    return kept.label
  }

  open(revision: number): Promise<Revision | undefined> {
    return this.#ask('revisions.open', { revision })
  }

  /** The data sheet holds this revision now; `text` is what the data sheet made of it. */
  hold({ id, label }: Pick<Revision, 'id' | 'label'>, text: string): void {
    this.#held = { id, label, text }
  }

  /** The data sheet holds a job that is no revision. */
  letGo(): void {
    this.#held = undefined
  }

  async #ask<N extends CallName>(name: N, argument: Argument<N>): Promise<Answer<N> | undefined> {
    const outcome = await this.#desk.call(name, argument)
    this.#refusal = outcome.ok ? undefined : outcome.error.message
    return outcome.ok ? outcome.value : undefined
  }
}
