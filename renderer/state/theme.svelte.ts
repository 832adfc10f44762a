/** Light or dark: as the system says, until a word says otherwise. */
import { MediaQuery } from 'svelte/reactivity'

export type Shade = 'light' | 'dark'

export const isShade = (value: unknown): value is Shade => value === 'light' || value === 'dark'

export class Theme {
  readonly #system = new MediaQuery('(prefers-color-scheme: dark)', false)
  #wanted = $state<Shade | undefined>()

  get shade(): Shade {
    return this.#wanted ?? (this.#system.current ? 'dark' : 'light')
  }

  want(shade: Shade): void {
    this.#wanted = shade
  }
}
