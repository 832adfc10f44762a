import { readdirSync, readFileSync } from 'node:fs'
import { expect, it } from 'vitest'

// A range that is not imported would be asked for in vain when it is met, and another glyph drawn in its place.
it('every range of the typeface of formulas is loaded', () => {
  const folder = new URL('../../node_modules/@mathjax/mathjax-stix2-font/mjs/svg/dynamic/', import.meta.url)
  const ranges = readdirSync(folder).filter((name) => name.endsWith('.js'))
  const source = readFileSync(new URL('../../app/print/glyphs.ts', import.meta.url), 'utf8')
  const imported = [...source.matchAll(/dynamic\/([\w-]+\.js)'/g)].map(([, name]) => name)
  expect(imported.sort()).toEqual(ranges.sort())
  expect(ranges.length).toBeGreaterThan(10)
})
