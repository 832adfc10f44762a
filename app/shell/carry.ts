/** Carries the window's calls to the desk, and its files to and from the disk. Only the window's own page is heard. */
import type { IpcMain, IpcMainEvent, IpcMainInvokeEvent, WebContents } from 'electron'
import { refuse, type Outcome } from '../../core/contract/errors.ts'
import { pickText, saveBytes } from './dialogs.ts'
import type { LastingDesk } from './lasting-desk.ts'
import { CHANNELS, pathOf } from './place.ts'

type Running = Map<number, AbortController>

/** Listens on the channels of the bridge. A message from any other page throws, which the sender sees as a rejection. */
export const carry = (ipc: IpcMain, desk: LastingDesk): void => {
  const running = new WeakMap<WebContents, Running>()

  const runningOf = (contents: WebContents): Running => {
    const known = running.get(contents)
    if (known !== undefined) return known
    const made: Running = new Map()
    const cancelAll = () => {
      for (const cancel of made.values()) cancel.abort()
      made.clear()
    }
    // Whoever asked is no longer there to be answered, and a page that is loaded anew counts its calls from one.
    contents.on('did-start-navigation', ({ isMainFrame, isSameDocument }) => {
      if (isMainFrame && !isSameDocument) cancelAll()
    })
    contents.on('render-process-gone', cancelAll)
    contents.on('destroyed', cancelAll)
    running.set(contents, made)
    return made
  }

  const call = async (event: IpcMainInvokeEvent, id: unknown, name: unknown, argument: unknown) => {
    requireWindow(event)
    if (typeof id !== 'number' || typeof name !== 'string') return refuse('argument', 'a call has a number and a name')
    const calls = runningOf(event.sender)
    if (calls.has(id)) return refuse('argument', `call ${id} runs already`)
    const cancel = new AbortController()
    calls.set(id, cancel)
    const onProgress = (done: number, of: number) => {
      if (!event.sender.isDestroyed() && !cancel.signal.aborted) event.sender.send(CHANNELS.progress, id, done, of)
    }
    try {
      return await desk.ask(name, argument, { signal: cancel.signal, onProgress })
    } finally {
      if (calls.get(id) === cancel) calls.delete(id)
    }
  }

  ipc.handle(CHANNELS.call, call)
  ipc.on(CHANNELS.cancel, (event, id: unknown) => {
    requireWindow(event)
    if (typeof id === 'number') runningOf(event.sender).get(id)?.abort()
  })
  ipc.handle(CHANNELS.save, (event, name: unknown, bytes: unknown): Promise<Outcome<boolean>> => {
    requireWindow(event)
    return saveBytes(event.sender, name, bytes)
  })
  ipc.handle(CHANNELS.pick, (event) => {
    requireWindow(event)
    return pickText(event.sender)
  })
}

/** The page must be the window's own, and no frame inside it. */
const requireWindow = ({ senderFrame }: IpcMainEvent | IpcMainInvokeEvent): void => {
  if (senderFrame === null || senderFrame.parent !== null || pathOf(senderFrame.url) === undefined)
    throw new Error('only the window of the program is heard')
}
