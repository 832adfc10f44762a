import { createHash } from 'node:crypto'
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { digest, fingerprint } from '../../core/job/fingerprint.ts'
import type { Json } from '../../core/job/json.ts'
import { accepted, rolledInFull } from './plant.ts'

const sha256 = (text: string): string => createHash('sha256').update(text, 'utf8').digest('hex')

describe('SHA-256', () => {
  // NIST, examples to FIPS 180-2 appendix B.1 to B.3.
  test.each([
    ['abc', 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad'],
    [
      'abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq',
      '248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1',
    ],
    ['a'.repeat(1_000_000), 'cdc76e5c9914fb9281a1c7e284d73e67f1809a48a497200e046d39ccc7112cd0'],
  ])('of %.60s', (text, expected) => {
    expect(digest(text)).toBe(expected)
  })

  test('agrees with the platform’s own', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme' }), (text) => {
        expect(digest(text)).toBe(sha256(text))
      }),
    )
  })
})

describe('the canonical form of RFC 8785', () => {
  test('the example of 3.2.2 to 3.2.4', () => {
    const json = JSON.parse(`{
      "numbers": [333333333.33333329, 1E30, 4.50, 2e-3, 0.000000000000000000000000001],
      "string": "\\u20ac$\\u000F\\u000aA'\\u0042\\u0022\\u005c\\\\\\"\\/",
      "literals": [null, true, false]
    }`) as Json
    const canonical =
      '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],' +
      '"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}'
    expect(fingerprint(json)).toBe(sha256(canonical))
  })

  test('the order of names in 3.2.3', () => {
    const names: Record<string, string> = {
      '\u20ac': 'Euro Sign',
      '\r': 'Carriage Return',
      '\ufb33': 'Hebrew Letter Dalet With Dagesh',
      '1': 'One',
      '\ud83d\ude00': 'Emoji: Grinning Face',
      '\u0080': 'Control',
      '\u00f6': 'Latin Small Letter O With Diaeresis',
    }
    const order = ['\r', '1', '\u0080', '\u00f6', '\u20ac', '\ud83d\ude00', '\ufb33']
    const canonical = `{${order.map((name) => `${JSON.stringify(name)}:${JSON.stringify(names[name])}`).join(',')}}`
    expect(fingerprint(names)).toBe(sha256(canonical))
  })

  // RFC 8785 appendix B: IEEE 754 bits -> text.
  test.each([
    ['0000000000000000', '0'],
    ['8000000000000000', '0'],
    ['0000000000000001', '5e-324'],
    ['8000000000000001', '-5e-324'],
    ['7fefffffffffffff', '1.7976931348623157e+308'],
    ['ffefffffffffffff', '-1.7976931348623157e+308'],
    ['4340000000000000', '9007199254740992'],
    ['c340000000000000', '-9007199254740992'],
    ['4430000000000000', '295147905179352830000'],
    ['44b52d02c7e14af5', '9.999999999999997e+22'],
    ['44b52d02c7e14af6', '1e+23'],
    ['44b52d02c7e14af7', '1.0000000000000001e+23'],
    ['444b1ae4d6e2ef4e', '999999999999999700000'],
    ['444b1ae4d6e2ef4f', '999999999999999900000'],
    ['444b1ae4d6e2ef50', '1e+21'],
    ['3eb0c6f7a0b5ed8c', '9.999999999999997e-7'],
    ['3eb0c6f7a0b5ed8d', '0.000001'],
    ['41b3de4355555553', '333333333.3333332'],
    ['41b3de4355555554', '333333333.33333325'],
    ['41b3de4355555555', '333333333.3333333'],
    ['41b3de4355555556', '333333333.3333334'],
    ['41b3de4355555557', '333333333.33333343'],
    ['becbf647612f3696', '-0.0000033333333333333333'],
    ['43143ff3c1cb0959', '1424953923781206.2'],
  ])('the number %s is written %s', (bits, text) => {
    const number = Buffer.from(bits, 'hex').readDoubleBE()
    expect(fingerprint(number)).toBe(sha256(text))
  })

  test('NaN and infinity are refused', () => {
    expect(() => fingerprint(Number.NaN)).toThrow()
    expect(() => fingerprint(Number.POSITIVE_INFINITY)).toThrow()
  })
})

test('the order of the fields in a job file does not matter, its entries do', () => {
  const job = rolledInFull()
  const turned = Object.fromEntries(Object.entries(job).reverse())
  expect(accepted(turned).fingerprint).toBe(accepted(job).fingerprint)
  expect(accepted({ ...job, units: 'us' }).fingerprint).not.toBe(accepted(job).fingerprint)
})
