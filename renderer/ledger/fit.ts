/** Formulas wider than their column: set smaller, and where that is not enough, scrolled sideways, by keys as well. */

/** For an element whose children of class `side` may be too wide. Keeps to it while the column changes; returns the end of it. */
export const fit = (formula: HTMLElement): (() => void) => {
  const sides = [...formula.querySelectorAll<HTMLElement>('.side')]
  const tooWide = (side: HTMLElement): boolean => side.scrollWidth > side.clientWidth + 1
  const settle = (): void => {
    for (const side of sides) {
      side.classList.remove('tight', 'scrolls')
      side.removeAttribute('tabindex')
      side.removeAttribute('role')
      side.removeAttribute('aria-label')
    }
    for (const side of sides.filter(tooWide)) {
      side.classList.add('tight')
      if (!tooWide(side)) continue
      side.classList.add('scrolls')
      side.tabIndex = 0
      side.setAttribute('role', 'group')
      side.setAttribute('aria-label', 'wide formula')
    }
  }
  // A change of width alone: settling changes the height, which must not start it again.
  let width = -1
  const observer = new ResizeObserver(() => {
    if (formula.clientWidth === width) return
    width = formula.clientWidth
    settle()
  })
  observer.observe(formula)
  void document.fonts.ready.then(settle)
  return () => observer.disconnect()
}
