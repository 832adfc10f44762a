import { readFileSync } from 'node:fs'
import PDFDocument from 'pdfkit'
import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { arrowParts } from '../../core/figure/arrow.ts'
import { momentFigure, shearFigure } from '../../core/figure/diagram.ts'
import { elevationFigure } from '../../core/figure/elevation.ts'
import { spread } from '../../core/figure/layout.ts'
import { sectionFigure } from '../../core/figure/section.ts'
import { svgOf } from '../../core/figure/svg.ts'
import { TEXT_SIZE, boxOf, textWidth } from '../../core/figure/text.ts'
import type { Figure } from '../../core/figure/types.ts'
import { anyStanding, plain, textsOf, withTrain, worst } from './plant.ts'

const styles = readFileSync(new URL('look.css', import.meta.url), 'utf8')

const figures = (): readonly Figure[] => {
  const review = withTrain({ spans: [9, 9], cranes: [{ loads: [1e5, 2e5], spacings: [2], overhang: 0.5 }] })
  const extreme = worst(review, 'moment', 0)
  const shown = { units: 'si', width: 150 } as const
  const { runway, girder } = plain.job
  return [
    elevationFigure(review, extreme, shown),
    momentFigure(review, extreme, shown),
    shearFigure(review, extreme, shown),
    sectionFigure(plain.section, girder.section, { ...shown, rail: runway.rail, wheelLoad: 1e5, sideThrust: 1e4 }),
  ]
}

describe('SVG', () => {
  it('has looks by class only, each class in the style sheet, and the same text each time', () => {
    for (const figure of figures()) {
      const svg = svgOf(figure)
      expect(svg).not.toMatch(/ style=|<style| fill=| stroke=|NaN/)
      for (const [, classes] of svg.matchAll(/class="([^"]*)"/g))
        for (const name of classes!.split(' ')) expect(styles).toContain(`.${name} `)
      expect(svgOf(figure)).toBe(svg)
      for (const { text } of textsOf(figure)) expect(svg).toContain(`>${text}</text>`)
    }
  })

  it('escapes what a name may hold', () => {
    const figure: Figure = {
      width: 120,
      height: 10,
      items: [{ item: 'text', at: [1, 2], text: `<b>"&'\u0001`, role: 'ink', anchor: 'start', turn: -90 }],
      alt: '"><script>',
    }
    const svg = svgOf(figure)
    expect(svg).toContain('&lt;b&gt;&quot;&amp;&#39;\ufffd</text>')
    expect(svg).toContain('aria-label="&quot;&gt;&lt;script&gt;"')
    expect(svg).toContain('transform="rotate(-90 1 2)"')
  })

  it('draws circles, hatches and outlines', () => {
    const square = [
      [0, 0],
      [5, 0],
      [5, 5],
    ] as const
    const svg = svgOf({
      width: 10,
      height: 10,
      items: [
        { item: 'area', points: square, fill: 'accentHatch' },
        { item: 'circle', centre: [5, 5], radius: 1, role: 'accent' },
      ],
      alt: '',
    })
    expect(svg).toContain('<polygon points="0,0 5,0 5,5" class="role-none fill-accent-hatch"/>')
    expect(svg).toContain('<circle cx="5" cy="5" r="1" class="role-accent fill-none"/>')
    const broken: Figure = { width: Number.NaN, height: 1, items: [], alt: '' }
    expect(() => svgOf(broken)).toThrow(RangeError)
  })
})

describe('texts', () => {
  it('are never wider in the face they are set in than the layout takes them for', () => {
    const font = new URL(
      '../../node_modules/@expo-google-fonts/ibm-plex-sans/400Regular/IBMPlexSans_400Regular.ttf',
      import.meta.url,
    )
    const set = new PDFDocument({ font: font.pathname }).fontSize(TEXT_SIZE)
    const check = (text: string): void => {
      expect(textWidth(text), text).toBeGreaterThanOrEqual(set.widthOfString(text) - 1e-9)
    }
    const signs = Array.from({ length: 95 }, (_, i) => String.fromCharCode(32 + i))
    for (const sign of [...signs, '−', '×', '·', '²', '³', '⁴', '⁸', '½']) check(sign)
    for (const figure of figures()) for (const { text } of textsOf(figure)) check(text)
    fc.assert(
      fc.property(anyStanding, (standing) => {
        const review = withTrain(standing)
        const extreme = worst(review, 'shear', standing.span)
        for (const { text } of textsOf(shearFigure(review, extreme, { units: 'us', width: 150 }))) check(text)
      }),
      { numRuns: 20 },
    )
  })

  it('are measured where they are turned', () => {
    const text = { item: 'text', at: [10, 20], text: '12 m', role: 'ink', anchor: 'start' } as const
    const width = textWidth('12 m')
    expect(boxOf(text)).toMatchObject({ left: 10, right: 10 + width })
    expect(boxOf({ ...text, turn: -90 })).toMatchObject({ top: 20 - width, bottom: 20 })
    expect(() => boxOf({ ...text, turn: 45 })).toThrow(RangeError)
  })
})

describe('the layout', () => {
  it('spreads things in order, apart and between the ends, and leaves alone what is clear', () => {
    expect(spread([10, 30], [5, 5], 0, 50)).toEqual([10, 30])
    expect(spread([10, 10], [4, 4], 0, 50)).toEqual([8, 12])
    expect(spread([0, 1], [30, 30], 0, 50)).toBeUndefined()
    const things = fc.array(
      fc.record({ at: fc.double({ min: -50, max: 150, noNaN: true }), size: fc.integer({ min: 1, max: 9 }) }),
      {
        maxLength: 11,
      },
    )
    fc.assert(
      fc.property(things, (list) => {
        const sorted = [...list].sort((a, b) => a.at - b.at)
        const sizes = sorted.map(({ size }) => size)
        const centres = spread(
          sorted.map(({ at }) => at),
          sizes,
          0,
          100,
        )!
        for (const [i, centre] of centres.entries()) {
          const before = i === 0 ? 0 : centres[i - 1]! + sizes[i - 1]! / 2
          expect(centre - sizes[i]! / 2).toBeGreaterThanOrEqual(before - 1e-9)
          expect(centre + sizes[i]! / 2).toBeLessThanOrEqual(100 + 1e-9)
        }
      }),
    )
  })
})

describe('an arrow', () => {
  it('ends where it points to', () => {
    const { shaft, head } = arrowParts({ item: 'arrow', from: [5, 0], to: [5, 9], role: 'ink' })
    expect(head[0]).toEqual([5, 9])
    expect(shaft[0]).toEqual([5, 0])
    expect(head[1][0] + head[2][0]).toBeCloseTo(10, 12)
    expect(() => arrowParts({ item: 'arrow', from: [5, 0], to: [5, 0], role: 'ink' })).toThrow(RangeError)
  })
})
