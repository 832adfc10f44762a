/** The fingerprint that is printed on every page and ties a result to its job. */
import { sha256 } from '@noble/hashes/sha2.js'
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js'
import canonicalize from 'canonicalize'
import type { Json } from './json.ts'

/**
 * SHA-256 (FIPS 180-4) of a JSON value in the canonical form of RFC 8785, as 64 hexadecimal digits. Given the job as entered,
 * after upgrade, without defaults. Throws on numbers that are not finite and on broken surrogate pairs, which no job read
 * without findings holds.
 */
export const fingerprint = (json: Json): string => digest(canonicalize(json) ?? '')

/** SHA-256 of a text in UTF-8, as 64 hexadecimal digits. */
export const digest = (text: string): string => bytesToHex(sha256(utf8ToBytes(text)))
