/** The last review that held. Asks the worker, at most one review at a time; of the texts that wait the newest wins. */
import type { FromLive } from '../../core/contract/live.ts'
import type { Line } from '../../core/formula/types.ts'
import type { Finding } from '../../core/job/read.ts'
import type { UnitSystem } from '../../core/quantity/kinds.ts'
import type { ReviewValues } from '../../core/review/values.ts'
import type { LivePort, ReviewState } from './types.ts'

export class Review implements ReviewState {
  #review = $state.raw<ReviewValues | undefined>()
  #milliseconds = $state<number | undefined>()
  #fault = $state<string | undefined>()
  #working = $state.raw<readonly Line[] | undefined>()
  #chosen = $state<string | undefined>()
  #place = $state(0)
  #asked = $state('')
  #answered = $state('')
  #refused = $state(false)
  #units: UnitSystem = 'us'
  #turn = 0
  #running: { readonly turn: number; readonly text: string } | undefined
  /** Turn of the review whose derivations the worker holds. */
  #held = 0
  readonly #port: LivePort
  readonly #found: (findings: readonly Finding[]) => void

  constructor(port: LivePort, found: (findings: readonly Finding[]) => void) {
    this.#port = port
    this.#found = found
    port.listen((answer) => this.#take(answer))
  }

  get review(): ReviewValues | undefined {
    return this.#review
  }
  get milliseconds(): number | undefined {
    return this.#milliseconds
  }
  get stale(): boolean {
    return this.#refused || this.#asked !== this.#answered
  }
  get fault(): string | undefined {
    return this.#fault
  }
  get working(): readonly Line[] | undefined {
    return this.#working
  }
  get chosen(): string | undefined {
    return this.#chosen
  }
  get place(): number {
    return this.#place
  }

  /** The job as it stands now, and the units its workings are written in. Never waits: what runs is let run, then this. */
  submit(text: string, units: UnitSystem): void {
    const otherUnits = units !== this.#units
    this.#units = units
    if (otherUnits) {
      this.#working = undefined
      this.#askWorking()
    }
    if (text === this.#asked) return
    this.#asked = text
    if (this.#running === undefined) this.#ask()
  }

  /** Another job comes in: figures of the one before must not stand beside its entries, nor may an answer to it come in. */
  start(text: string, units: UnitSystem): void {
    this.#running = undefined
    this.#asked = ''
    this.#answered = ''
    this.#refused = false
    this.#review = undefined
    this.#working = undefined
    this.#chosen = undefined
    this.#place = 0
    this.submit(text, units)
  }

  choose(id: string, place = 0): void {
    this.#chosen = id
    this.#place = place
    this.#working = undefined
    this.#askWorking()
  }

  #ask(): void {
    this.#running = { turn: ++this.#turn, text: this.#asked }
    this.#port.post({ ask: 'review', ...this.#running })
  }

  #askWorking(): void {
    const check = this.#review?.checks.find(({ id }) => id === this.#chosen)
    if (check === undefined) return
    this.#port.post({
      ask: 'working',
      turn: this.#held,
      id: check.id,
      place: this.#place,
      units: this.#units,
    })
  }

  #take(answer: FromLive): void {
    if (answer.answer === 'working') {
      const wanted = answer.turn === this.#held && answer.id === this.#chosen && answer.place === this.#place
      // Lines that say the same stay as they are: typesetting them again would cost more than the comparison.
      if (wanted && JSON.stringify(answer.lines) !== JSON.stringify(this.#working)) this.#working = answer.lines
      return
    }
    const running = this.#running
    if (running === undefined || answer.turn !== running.turn) {
      if (answer.answer === 'fault') this.#fault = answer.message
      return
    }
    this.#running = undefined
    this.#answered = running.text
    this.#refused = answer.answer !== 'review'
    this.#fault = answer.answer === 'fault' ? answer.message : undefined
    if (answer.answer === 'findings') this.#found(answer.findings)
    if (answer.answer === 'review') this.#show(answer)
    if (this.#asked !== this.#answered) this.#ask()
  }

  #show({ review, milliseconds, turn }: Extract<FromLive, { answer: 'review' }>): void {
    this.#found([])
    this.#review = review
    this.#milliseconds = milliseconds
    this.#held = turn
    const chosen = review.checks.find(({ id }) => id === this.#chosen)
    if (chosen === undefined) this.#chosen = review.governing ?? review.checks[0]?.id
    if (chosen === undefined || this.#place > chosen.places.length) {
      this.#place = 0
      this.#working = undefined
    }
    // Those of the review before stand until the new ones are there.
    this.#askWorking()
  }
}
