import { describe, expect, it } from 'vitest'
import { chapter } from '../../core/formula/chapter.ts'
import type { Line } from '../../core/formula/types.ts'
import { working, type WorkingRecorder } from '../../core/formula/working.ts'
import { writeWorking } from '../../core/formula/write.ts'
import { as, type Metre, type UnitSystem } from '../../core/quantity/kinds.ts'
import { F2, F2_1, F2_2, F2_4, F2_LTB, girder, of } from './examples.ts'
import { faultsOf } from './xml.ts'

const written = (record: (on: WorkingRecorder) => unknown, system: UnitSystem = 'us'): Line[] => {
  const on = working()
  record(on)
  return writeWorking(on, system)
}
const texts = (record: (on: WorkingRecorder) => unknown, system: UnitSystem = 'us'): string[] =>
  written(record, system).map((line) => line.text)
const spanOf = (L_b: Metre) => ({ ...girder, L_b })

describe('a formula in a working', () => {
  it('is printed with values that multiply out, then in the usual unit', () => {
    const record = (on: WorkingRecorder): unknown => on.take(F2_1, girder)
    expect(texts(record)).toEqual(['M_p = F_y Z_x = (50 ksi) (244 in³) = 12,200 kip-in = 1,017 kip-ft'])
    expect(texts(record, 'si')).toEqual(['M_p = F_y Z_x = (344.7 MPa) (3,998,444 mm³) = 1.378×10⁹ N·mm = 1,378 kN·m'])
    expect(F2_1.working(girder, 'us').text).toBe(texts(record)[0])
  })

  it('keeps the numbers as the source prints them and brackets as standards do', () => {
    expect(texts((on) => on.take(F2_4, girder))).toEqual([
      'F_cr = [C_b pi^2 E/(L_b/r_ts)^2] sqrt(1 + 0.078 [J c/(S_x h_o)] (L_b/r_ts)^2)' +
        ' = {1 pi^2 (29,000 ksi)/[(240 in)/(2.54 in)]^2}' +
        ' sqrt(1 + 0.078 {(2.81 in⁴) * 1/[(213 in³) (26.1 in)]} [(240 in)/(2.54 in)]^2) = 37.28 ksi',
    ])
    const printed = F2.formula('F2-5', {
      gives: ['x', 'ratio'],
      where: { a: 'ratio' },
      text: '1.10*a^0.50 - 20000*a - (a - 0.0001)',
      note: 'in words',
    })
    expect(printed.working({ a: 0.00002 }, 'us').text).toBe(
      'x = 1.10 a^0.50 - 20,000 a - (a - 0.0001) = 1.10 (2×10⁻⁵)^0.50 - 20,000 * 2×10⁻⁵ - (2×10⁻⁵ - 0.0001) = -0.3950'.replace(
        '= -',
        '= \u2212',
      ) + '   in words',
    )
  })

  it('does not repeat what is said already', () => {
    const one = F2.formula('one', { gives: ['R_pc', 'ratio'], where: {}, text: '1.0' })
    const same = F2.formula('same', { gives: ['M_n', 'moment'], where: { M_p: 'moment' }, text: 'M_p' })
    expect(texts((on) => [on.take(one, {}), on.take(same, girder)])).toEqual([
      'R_pc = 1.0',
      'M_n = M_p = 12,200 kip-in = 1,017 kip-ft',
    ])
    expect(written((on) => on.take(one, {}))[0]!.values).toBe('')
  })

  it('says where its bound governs', () => {
    const raised = { ...girder, C_b: 1.9 }
    const [line] = texts((on) => on.take(F2_2, raised))
    expect(line).toMatch(
      /^M_n = C_b \{.*\} \(<= M_p\) = 1\.9 \{.*\} = 14,6\d\d kip-in > M_p = 12,200 kip-in, so M_n = /,
    )
    expect(line).toMatch(/, so M_n = 12,200 kip-in = 1,017 kip-ft$/)
    expect(texts((on) => on.take(F2_2, girder))[0]).not.toContain('so M_n')

    const minor = chapter('AISC 360-22', 'F6').formula('F6-1', {
      gives: ['M_p', 'moment'],
      where: { F_y: 'stress', Z_y: 'modulus', S_y: 'modulus' },
      text: 'F_y*Z_y',
      atMost: '1.6*F_y*S_y',
    })
    const values = { F_y: girder.F_y, Z_y: of('modulus', 50, 'in3'), S_y: of('modulus', 30, 'in3') }
    expect(minor.working(values, 'us').text).toBe(
      'M_p = F_y Z_y (<= 1.6 F_y S_y) = (50 ksi) (50 in³) = 2,500 kip-in' +
        ' > 1.6 F_y S_y = 1.6 (50 ksi) (30 in³) = 2,400 kip-in, so M_p = 2,400 kip-in = 200 kip-ft',
    )

    const k_c = F2.formula('k_c', {
      gives: ['k_c', 'ratio'],
      where: { h: 'length', t_w: 'length' },
      text: '4/sqrt(h/t_w)',
      atLeast: '0.35',
      atMost: '0.76',
    })
    const line_k = (h: number): string =>
      k_c.working({ h: of('length', h, 'in'), t_w: of('length', 1, 'in') }, 'us').text
    expect(line_k(64)).toBe('k_c = 4/sqrt(h/t_w) (0.35 <= k_c <= 0.76) = 4/sqrt((64 in)/(1 in)) = 0.5')
    expect(line_k(400)).toBe(
      'k_c = 4/sqrt(h/t_w) (0.35 <= k_c <= 0.76) = 4/sqrt((400 in)/(1 in)) = 0.2 < 0.35, so k_c = 0.35',
    )
  })

  it('prints a constant as its source does where the unit fits', () => {
    const J10_6 = chapter('AISC 360-22', 'J10').formula('J10-6', {
      gives: ['R_n', 'force'],
      where: { t_w: 'length', t_f: 'length', h: 'length' },
      constants: { C_r: ['stress', of('stress', 960_000, 'ksi'), '960,000 ksi'] },
      text: 'C_r*t_w^3*t_f/h^2',
    })
    const values = { t_w: of('length', 0.5, 'in'), t_f: of('length', 0.6, 'in'), h: of('length', 20, 'in') }
    expect(J10_6.working(values, 'us').text).toBe(
      'R_n = C_r t_w^3 t_f/h^2 = (960,000 ksi) (0.5 in)^3 (0.6 in)/(20 in)^2 = 180 kip',
    )
    expect(J10_6.working(values, 'si').text).toBe(
      'R_n = C_r t_w^3 t_f/h^2 = (6,618,967 MPa) (12.7 mm)^3 (15.24 mm)/(508 mm)^2 = 800,680 N = 800.7 kN',
    )
  })
})

describe('cases in a working', () => {
  const first = (values: typeof girder, system: UnitSystem = 'us'): Line =>
    written((on) => on.take(F2_LTB, values), system)[0]!

  it('print the condition with its values, then the equation', () => {
    const [condition, formula] = written((on) => on.take(F2_LTB, girder))
    expect(condition).toMatchObject({
      kind: 'condition',
      clause: 'AISC 360-22 F2.2(b)',
      text: 'L_p = 7.31 ft < L_b = 20 ft <= L_r = 20.8 ft, F2.2(b)',
    })
    expect(formula).toMatchObject({ kind: 'formula', clause: 'AISC 360-22 F2-2' })
    expect(formula!.text).toBe(
      'M_n = C_b {M_p - (M_p - 0.7 F_y S_x) [(L_b - L_p)/(L_r - L_p)]} (<= M_p)' +
        ' = 1 {12,200 kip-in - [12,200 kip-in - 0.7 (50 ksi) (213 in³)] [(240 in - 87.72 in)/(249.6 in - 87.72 in)]}' +
        ' = 7,736 kip-in = 644.7 kip-ft',
    )
    expect(first(girder, 'si').text).toBe('L_p = 2.228 m < L_b = 6.096 m <= L_r = 6.340 m, F2.2(b)')
  })

  it('name only the bound that counts', () => {
    expect(first(spanOf(of('distance', 6, 'ft'))).text).toBe('L_b = 6 ft <= L_p = 7.31 ft, F2.2(a)')
    expect(first(spanOf(of('distance', 30, 'ft'))).text).toBe('L_b = 30 ft > L_r = 20.8 ft, F2.2(c)')
  })

  it('say that their result is that of the equation used', () => {
    const [, formula] = texts((on) => on.take(F2_LTB, spanOf(of('distance', 6, 'ft'))))
    expect(formula).toBe('M_n = M_p = F_y Z_x = (50 ksi) (244 in³) = 12,200 kip-in = 1,017 kip-ft')
  })

  it('explain compound conditions and cases in cases by what decided', () => {
    const one = F2.formula('one', { gives: ['x', 'ratio'], where: {}, text: '1' })
    const inner = F2.cases(
      'F2.8',
      [
        { clause: '(i)', when: 'I_yc/I_y <= 0.23', use: one },
        { clause: '(ii)', otherwise: one },
      ],
      {
        I_yc: 'inertia',
        I_y: 'inertia',
      },
    )
    const outer = F2.cases(
      'F2.9',
      [
        { clause: '(a)', when: 'a > 1 and b > 1', use: one },
        { clause: '(b)', when: 'a > 5 or b > 5', use: one },
        { clause: '(c)', otherwise: inner },
      ],
      { a: 'ratio', b: 'ratio' },
    )
    const at = (a: number, b: number): string[] =>
      texts((on) => on.take(outer, { a, b, I_yc: as('inertia', 3), I_y: as('inertia', 10) }))
    expect(at(2, 3)).toEqual(['a = 2 > 1 and b = 3 > 1, F2.9(a)', 'x = 1'])
    expect(at(0, 6)).toEqual(['a = 0 <= 1 and b = 6 > 5, F2.9(b)', 'x = 1'])
    expect(at(0, 3)).toEqual(['a = 0 <= 1 and b = 3 <= 5, F2.9(c)', 'I_yc/I_y = 0.3 > 0.23, F2.8(ii)', 'x = 1'])
  })
})

describe('a recorder', () => {
  const record = (on: WorkingRecorder): void => {
    on.given('L_b', 'distance', girder.L_b, 'the span, no bracing in it', F2.clause('F2.2'))
    on.note('The web is compact & the flange too.', F2.clause('F2.1'))
    on.row('Table 1-1', 'W27X84', [
      ['Z_x', 'modulus', girder.Z_x],
      ['S_x', 'modulus', girder.S_x],
    ])
    on.iterate('x', 'distance', of('distance', 10.5, 'ft'), 1.23e-12, 8, 'where the shear is zero')
    on.compare('M_u', { kind: 'moment', value: of('moment', 620, 'kip ft') }, '<=', 'phi_b M_n', {
      kind: 'moment',
      value: of('moment', 838, 'kip ft'),
    })
  }

  it('prints every kind of step', () => {
    expect(written(record).map(({ kind, clause, text }) => [kind, clause, text])).toEqual([
      ['given', 'AISC 360-22 F2.2', 'L_b = 20 ft   the span, no bracing in it'],
      ['note', 'AISC 360-22 F2.1', 'The web is compact & the flange too.'],
      ['row', '', 'Z_x = 244 in³, S_x = 213 in³   Table 1-1, W27X84'],
      ['iteration', '', 'x = 10.5 ft   where the shear is zero, by iteration, residual 1.2×10⁻¹² after 8 evaluations'],
      ['compare', '', 'M_u = 620 kip-ft <= phi_b M_n = 838 kip-ft'],
    ])
    expect(texts(record, 'si')).toEqual([
      'L_b = 6.096 m   the span, no bracing in it',
      'The web is compact & the flange too.',
      'Z_x = 3,998,444 mm³, S_x = 3,490,445 mm³   Table 1-1, W27X84',
      'x = 3.200 m   where the shear is zero, by iteration, residual 1.2×10⁻¹² after 8 evaluations',
      'M_u = 840.6 kN·m <= phi_b M_n = 1,136 kN·m',
    ])
  })

  it('gives back what it is given, and tells whether a comparison holds', () => {
    const on = working()
    expect(on.given('L_b', 'distance', girder.L_b)).toBe(girder.L_b)
    expect(on.take(F2_1, girder)).toBe(F2_1.value(girder))
    expect(on.iterate('x', 'ratio', 0.5, 0, 3, '')).toBe(0.5)
    const quantity = (value: number) => ({ kind: 'ratio', value }) as const
    const holds = (['<=', '<', '>=', '>'] as const).map((op) => on.compare('a', quantity(2), op, 'b', quantity(2)))
    expect(holds).toEqual([true, false, true, false])
    expect(writeWorking(on, 'us').at(-1)!.text).toBe('a = 2 <= b = 2   not satisfied')
  })

  it('includes another derivation, as it stands when it is written', () => {
    const on = working()
    on.note('before')
    const other = working()
    other.note('inside')
    on.include(other, ['M_n', 'moment', as('moment', 1)], 'strength')
    expect(writeWorking(on, 'us').map((line) => line.text)).toEqual(['before', 'inside'])
  })

  it('takes no figure that is not finite', () => {
    expect(() => working().given('L_b', 'distance', as('distance', NaN), '', F2.clause('F2.2'))).toThrow(
      'AISC 360-22 F2.2: L_b is not a finite number',
    )
    const infinite = { kind: 'ratio', value: Infinity } as const
    expect(() => working().compare('a', infinite, '<=', 'b', infinite)).toThrow('working: a is not a finite number')
    expect(() => working().row('t', 'k', [['a', 'ratio', NaN]])).toThrow('a is not a finite number')
    expect(() => working().iterate('a', 'ratio', NaN, 0, 1, '')).toThrow('a is not a finite number')
  })

  it('typesets every line as well-formed MathML, in both systems', () => {
    const all = (on: WorkingRecorder): void => {
      record(on)
      on.take(F2_LTB, girder)
      on.take(F2_LTB, { ...girder, C_b: 1.9 })
      on.take(F2_4, girder)
      on.given('a < b & "c"', 'ratio', -1e-9)
    }
    for (const system of ['us', 'si'] as const)
      for (const { symbols, values } of written(all, system))
        for (const part of [symbols, values]) if (part !== '') expect(faultsOf(part), part).toEqual([])
  })
})

describe('MathML', () => {
  const parts = (line: Line): string[] =>
    [line.symbols, line.values].map((part) => part.replace(/^<math [^>]*><mrow>/, '').replace('</mrow></math>', ''))
  const M = (name: string, below: string): string => `<msub><mi>${name}</mi><mrow><mi>${below}</mi></mrow></msub>`

  it('sets symbols with subscripts, Greek letters and units upright', () => {
    const [symbols, values] = parts(F2_1.working(girder, 'us'))
    expect(symbols).toBe(`${M('M', 'p')}<mo>=</mo>${M('F', 'y')}<mo>\u2062</mo>${M('Z', 'x')}`)
    expect(values).toContain('<mn>244</mn><mspace width="0.2em"/><msup><mtext>in</mtext><mn>3</mn></msup>')
    expect(values).toContain('<mtext>kip-ft</mtext>')
    const [compared] = parts(
      written((on) =>
        on.compare('phi_b M_n', { kind: 'ratio', value: 1 }, '<=', 'M_n/Omega', { kind: 'ratio', value: 2 }),
      )[0]!,
    )
    expect(compared).toBe(
      `${M('φ', 'b')}<mo>\u2062</mo>${M('M', 'n')}<mo>≤</mo>` +
        `<mfrac><mrow>${M('M', 'n')}</mrow><mrow><mi>Ω</mi></mrow></mfrac>`,
    )
  })

  it('stacks fractions, so that they want brackets only under a power', () => {
    const formula = F2.formula('x', {
      gives: ['x', 'ratio'],
      where: { a: 'ratio', b: 'ratio' },
      text: '(a + b)/(a - b)*(a/b)^2*sqrt(a)*cbrt(b)*abs(a)*min(a, -b)',
    })
    const [symbols] = parts(formula.working({ a: 1, b: 2 }, 'us'))
    const sum = '<mi>a</mi><mo>+</mo><mi>b</mi>'
    const fraction = '<mfrac><mrow><mi>a</mi></mrow><mrow><mi>b</mi></mrow></mfrac>'
    expect(symbols).toContain(`<mfrac><mrow>${sum}</mrow><mrow><mi>a</mi><mo>\u2212</mo><mi>b</mi></mrow></mfrac>`)
    expect(symbols).toContain(
      `<msup><mrow><mrow><mo>(</mo>${fraction}<mo>)</mo></mrow></mrow><mrow><mn>2</mn></mrow></msup>`,
    )
    expect(symbols).toContain('<msqrt><mi>a</mi></msqrt>')
    expect(symbols).toContain('<mroot><mrow><mi>b</mi></mrow><mn>3</mn></mroot>')
  })

  it('sets a bound as the standard does', () => {
    const [symbols, values] = parts(F2_2.working(girder, 'us'))
    expect(symbols).toMatch(/<mo>\]<\/mo><\/mrow><mo>≤<\/mo><msub><mi>M<\/mi><mrow><mi>p<\/mi><\/mrow><\/msub>$/)
    expect(values).toMatch(/^<mo>=<\/mo>/)
  })

  it('escapes words', () => {
    const [line] = written((on) => on.given('a < b', 'ratio', 1))
    expect(line!.symbols).toContain('<mtext>a &lt; b</mtext>')
  })
})
