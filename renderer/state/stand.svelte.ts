/** Where the crane stands in the elevation, and the station at which the diagrams are read. */
import { as, type Metre } from '../../core/quantity/kinds.ts'
import type { ReviewValues } from '../../core/review/values.ts'
import type { StandState } from './types.ts'

type Place = Parameters<StandState['at']>[0]

export class Stand implements StandState {
  #span = $state(0)
  #train = $state(0)
  #lead = $state(as('distance', 0))
  #mirrored = $state(false)
  #station = $state(as('distance', 0))
  #placed = false

  get span(): number {
    return this.#span
  }
  get train(): number {
    return this.#train
  }
  get lead(): Metre {
    return this.#lead
  }
  get mirrored(): boolean {
    return this.#mirrored
  }
  get station(): Metre {
    return this.#station
  }

  at({ span, train, lead, mirrored, station }: Place): void {
    this.#span = span
    if (train !== undefined) this.#train = train
    this.#lead = lead
    this.#mirrored = mirrored
    this.#station = station
  }

  moveTo(lead: Metre): void {
    this.#lead = lead
  }

  readAt(station: Metre): void {
    this.#station = station
  }

  chooseTrain(train: number): void {
    this.#train = train
  }

  /** Another job comes in: the crane is stood anew. */
  leave(): void {
    this.#placed = false
  }

  /** Keeps to what the review has: the first one is stood at its greatest moment, and so is one whose span or train is gone. */
  fit({ envelope, job, trains }: ReviewValues): void {
    const there = this.#placed && this.#span < job.runway.spans.length && this.#train < trains.length
    const length = job.runway.spans.reduce((sum, span) => sum + span, 0)
    if (!there || this.#station > length || this.#lead > length) this.at(envelope.moment.max)
    if (this.#train >= trains.length) this.#train = 0
    this.#placed = true
  }
}
