/** Who may ask the page for what. Everything is judged before a body is read. */
import type { IncomingMessage } from 'node:http'

export interface Refusal {
  readonly status: number
  readonly message: string
}

/**
 * Why a request is refused before anything else is looked at; undefined where it may go on. `authority` is the page's own host and
 * port: another Host means that a foreign name was made to lead here, another Origin or Sec-Fetch-Site that a foreign page asks.
 */
export const refusalOf = (request: IncomingMessage, authority: string): Refusal | undefined => {
  const { method, headers, url = '' } = request
  const get = method === 'GET'
  if (headers.host !== authority) return { status: 403, message: 'foreign Host' }
  if (headers.origin !== undefined && headers.origin !== `http://${authority}`)
    return { status: 403, message: 'foreign Origin' }
  if (!siteMay(request)) return { status: 403, message: 'foreign page' }
  if (!/^\/[\w.\-/]*$/.test(url)) return { status: 400, message: 'no such address' }
  if (!get && method !== 'POST') return { status: 405, message: 'only GET and POST' }
  if (get) return ASKED.test(url) ? { status: 405, message: 'only POST' } : undefined
  if (!ASKED.test(url)) return { status: 405, message: 'only GET' }
  if (headers.origin === undefined) return { status: 403, message: 'no Origin' }
  if (headers['content-type'] !== 'application/json') return { status: 415, message: 'only application/json' }
  return undefined
}

/** What is asked with POST; everything else is a file of the window. */
const ASKED = /^\/(?:token|watch|call\/.*)$/

/**
 * A browser says where a request comes from. The page itself asks for everything; a user or another page (the file that opens
 * the browser is one) may only go to the window as a whole, which holds no secret and does nothing without a key.
 */
const siteMay = ({ method, headers, url }: IncomingMessage): boolean => {
  const site = headers['sec-fetch-site']
  if (site === undefined || site === 'same-origin') return true
  if (method !== 'GET') return false
  if (site === 'none') return true
  return url === '/' && headers['sec-fetch-mode'] === 'navigate' && headers['sec-fetch-dest'] === 'document'
}
