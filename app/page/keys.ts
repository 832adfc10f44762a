/** Keys, each good for one swap, and the tokens that pages were given for them. */
import { createHash, randomBytes, timingSafeEqual } from 'node:crypto'

export interface Keys {
  readonly newKey: () => string
  /** A token for a key that was not used yet, else undefined. */
  readonly swap: (key: string) => string | undefined
  readonly isToken: (token: string | undefined) => boolean
}

export const keysOf = (): Keys => {
  const keys: Buffer[] = []
  const tokens: Buffer[] = []
  const made = (kept: Buffer[]): string => {
    const secret = randomBytes(32).toString('base64url')
    kept.push(digest(secret))
    return secret
  }
  return {
    newKey: () => made(keys),
    swap: (key) => {
      const index = placeOf(key, keys)
      if (index < 0) return undefined
      keys.splice(index, 1)
      return made(tokens)
    },
    isToken: (token) => token !== undefined && placeOf(token, tokens) >= 0,
  }
}

/** Digests are of one length, and comparing them tells nothing of the secret by the time it takes. */
const digest = (secret: string): Buffer => createHash('sha256').update(secret).digest()

const placeOf = (secret: string, kept: readonly Buffer[]): number => {
  const given = digest(secret)
  return kept.findIndex((one) => timingSafeEqual(one, given))
}
