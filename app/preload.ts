/** The bridge between the window and the shell. It runs in the sandbox and knows nothing but the channels. */
import { contextBridge, ipcRenderer } from 'electron'
import type { Bridge } from '../core/contract/carriers.ts'
import { CHANNELS } from './shell/place.ts'

const listening = new Map<number, (done: number, of: number) => void>()

ipcRenderer.on(CHANNELS.progress, (_event, id: number, done: number, of: number) => listening.get(id)?.(done, of))

const bridge: Bridge = {
  call: async (id, name, argument, onProgress) => {
    listening.set(id, onProgress)
    try {
      return (await ipcRenderer.invoke(CHANNELS.call, id, name, argument)) as Awaited<ReturnType<Bridge['call']>>
    } finally {
      listening.delete(id)
    }
  },
  cancel: (id) => ipcRenderer.send(CHANNELS.cancel, id),
  saveBytes: (name, bytes) => ipcRenderer.invoke(CHANNELS.save, name, bytes) as ReturnType<Bridge['saveBytes']>,
  pickText: () => ipcRenderer.invoke(CHANNELS.pick) as ReturnType<Bridge['pickText']>,
}

contextBridge.exposeInMainWorld('longtravel', bridge)
