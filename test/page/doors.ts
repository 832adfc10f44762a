/** The loopback page and its window's side, in one process. */
import { mkdirSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { Worker } from 'node:worker_threads'
import { onTestFinished } from 'vitest'
import { deskOf, startDesk } from '../../app/desk/desk.ts'
import { LIMITS, startPage, type Limits, type Page } from '../../app/page/page.ts'
import { lastingDesk, type LastingDesk } from '../../app/shell/lasting-desk.ts'
import { pageDesk, type Place } from '../../renderer/desk/page.ts'
import type { Desk } from '../../renderer/desk/desk.ts'
import { newFolder } from '../store/folder.ts'

const closing = (desk: LastingDesk): LastingDesk => {
  onTestFinished(async () => {
    await desk.close()
  })
  return desk
}

/** The desk as it is. */
export const realDesk = (): LastingDesk => {
  const home = newFolder()
  return closing(lastingDesk(() => startDesk({ home })))
}

/** A desk whose printer does what a job's title says. */
export const stubDesk = (): LastingDesk => {
  const home = newFolder()
  const stub = new URL('../desk/stub-worker.ts', import.meta.url)
  return closing(lastingDesk(() => deskOf(new Worker(stub, { workerData: { home } }))))
}

/** A folder as the build leaves it, with a file beside it that nobody may have. */
export const windowFolder = (): string => {
  const folder = join(newFolder(), 'renderer')
  mkdirSync(join(folder, 'assets'), { recursive: true })
  writeFileSync(join(folder, 'index.html'), '<!doctype html><title>Window</title>')
  writeFileSync(join(folder, 'assets', 'main-1a_B.js'), 'export {}')
  writeFileSync(join(folder, '..', 'secret.json'), '"secret"')
  return folder
}

export const pageOf = async (desk: LastingDesk, limits: Partial<Limits> = {}): Promise<Page> => {
  const page = await startPage(desk, windowFolder(), { ...LIMITS, ...limits })
  onTestFinished(() => page.close())
  return page
}

/** What a browser knows of its place, and the headers that it sets by itself. */
export const placeOf = (address: string, stored?: { token: string | null }): Place => {
  const { origin, hash } = new URL(address)
  const kept = stored ?? { token: null }
  return {
    fetch: (path, init) =>
      fetch(origin + path, {
        ...init,
        headers: { ...(init.headers as Record<string, string>), origin, 'sec-fetch-site': 'same-origin' },
      }),
    key: new URLSearchParams(hash.slice(1)).get('key') ?? undefined,
    memory: { read: () => kept.token, write: (token) => void (kept.token = token) },
  }
}

export const overPage = async (desk: LastingDesk): Promise<Desk> => pageDesk(placeOf((await pageOf(desk)).newAddress()))
