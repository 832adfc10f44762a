/** One calc sheet being made by the desk: how far it is, and a way to stop it. */
import type { Answer, Argument } from '../../core/contract/calls.ts'
import type { Desk } from '../desk/client.ts'

export class Printing {
  #running = $state(false)
  #done = $state(0)
  #of = $state(0)
  #refusal = $state<string | undefined>()
  #stopper = new AbortController()
  readonly #desk: Pick<Desk, 'call'>

  constructor(desk: Pick<Desk, 'call'>) {
    this.#desk = desk
  }

  get running(): boolean {
    return this.#running
  }
  get done(): number {
    return this.#done
  }
  get of(): number {
    return this.#of
  }
  get refusal(): string | undefined {
    return this.#refusal
  }

  /** The sheet, or undefined where it was stopped or refused. One at a time. */
  async print(argument: Argument<'sheet.print'>): Promise<Answer<'sheet.print'> | undefined> {
    if (this.#running) return undefined
    this.#running = true
    this.#done = 0
    this.#of = 0
    this.#refusal = undefined
    this.#stopper = new AbortController()
    const outcome = await this.#desk.call('sheet.print', argument, {
      signal: this.#stopper.signal,
      onProgress: (done, of) => {
        this.#done = done
        this.#of = of
      },
    })
    this.#running = false
    if (outcome.ok) return outcome.value
    this.#refusal = outcome.error.kind === 'cancelled' ? 'Stopped. No sheet was made.' : outcome.error.message
    return undefined
  }

  stop(): void {
    this.#stopper.abort()
  }
}
