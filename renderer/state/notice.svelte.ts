/** What the window has to say: one line, with a way back where something was replaced. */
export class Notice {
  #text = $state('')
  #grave = $state(false)
  #back = $state.raw<(() => void) | undefined>()

  get text(): string {
    return this.#text
  }
  /** Whether something was refused or failed. */
  get grave(): boolean {
    return this.#grave
  }
  /** Takes back what is told. */
  get back(): (() => void) | undefined {
    return this.#back
  }

  say(text: string, back?: () => void): void {
    this.#text = text
    this.#grave = false
    this.#back = back
  }

  warn(text: string): void {
    this.#text = text
    this.#grave = true
    this.#back = undefined
  }

  clear(): void {
    this.say('')
  }
}
