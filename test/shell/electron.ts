/** A stand-in for Electron that records what the shell asks of it, and carries messages between the window and the shell as clones. */
import { vi } from 'vitest'
import type { Bridge } from '../../core/contract/carriers.ts'

type Listener = (...given: never[]) => unknown

/** What happened, in the order in which it did. */
export interface Event {
  readonly defaultPrevented: boolean
  readonly preventDefault: () => void
}

const event = (): Event => {
  const made = { defaultPrevented: false, preventDefault: () => void (made.defaultPrevented = true) }
  return made
}

const emitter = () => {
  const listeners = new Map<string, Listener[]>()
  const on = (name: string, listener: Listener) => void listeners.set(name, [...(listeners.get(name) ?? []), listener])
  return {
    on,
    once: on,
    /** Calls the listeners and gives the event that they were given. */
    emit: (name: string, ...rest: unknown[]): Event => {
      const given = event()
      for (const listener of listeners.get(name) ?? []) (listener as (...all: unknown[]) => unknown)(given, ...rest)
      return given
    },
    /** As `emit`, for events whose one argument is the event itself. */
    emitWith: (name: string, details: object): void => {
      for (const listener of listeners.get(name) ?? []) (listener as (details: object) => unknown)(details)
    },
  }
}

/** What a test may look at and turn. */
export interface StandIn {
  readonly module: Record<string, unknown>
  readonly calls: string[]
  readonly windows: {
    readonly options: Record<string, unknown>
    readonly address: () => string
    readonly shown: () => boolean
  }[]
  readonly app: ReturnType<typeof emitter>
  readonly contents: ReturnType<typeof emitter> & {
    readonly opens: (details: { readonly url: string }) => { readonly action: string }
  }
  readonly session: {
    readonly asks: (permission: string) => boolean
    readonly checks: () => boolean
    readonly device: () => boolean
    readonly download: () => Event
    /** Patterns of addresses, and what is decided on a request that fits one. */
    readonly requests: () => { readonly urls: readonly string[]; readonly cancel: boolean | undefined }
  }
  readonly schemes: readonly { readonly scheme: string; readonly privileges: Record<string, boolean> }[]
  readonly serve: (request: { readonly url: string; readonly method: string }) => Promise<Response>
  /** What the preload put into the window. */
  readonly bridge: () => Bridge
  /** The page that asks: its address, and whether it is a frame inside the window. */
  readonly sender: { url: string; inner: boolean; none: boolean }
  readonly invoke: (channel: string, ...given: unknown[]) => Promise<unknown>
  readonly send: (channel: string, ...given: unknown[]) => void
  /** Answers of the dialogs to come. */
  readonly dialogs: {
    save: { canceled: boolean; filePath: string }
    open: { filePaths: string[] }
    readonly proposed: string[]
  }
  readonly exited: Promise<number>
}

export const standIn = ({ first = true }: { readonly first?: boolean } = {}): StandIn => {
  const calls: string[] = []
  const record =
    (name: string) =>
    (...given: unknown[]) =>
      void calls.push([name, ...given.map(String)].join(' '))
  const windows: StandIn['windows'] = []
  const app = emitter()
  const exit = Promise.withResolvers<number>()
  const inWindow = emitter()
  const handlers = new Map<string, Listener>()
  const fromShell = emitter()
  const sender: StandIn['sender'] = { url: 'longtravel://window/', inner: false, none: false }
  const dialogs: StandIn['dialogs'] = { save: { canceled: true, filePath: '' }, open: { filePaths: [] }, proposed: [] }
  const schemes: StandIn['schemes'][number][] = []
  let openHandler: Listener = () => undefined
  const session: Record<string, Listener> = {}
  let bridge: Bridge | undefined
  let serve: StandIn['serve'] | undefined

  const contents = {
    ...inWindow,
    isDestroyed: () => false,
    send: (channel: string, ...given: unknown[]) =>
      void fromShell.emit(channel, ...given.map((one) => structuredClone(one))),
    setWindowOpenHandler: (handler: Listener) => void (openHandler = handler),
  }
  /** A new event for each message, as Electron makes them. */
  const from = () => {
    const frame = { url: sender.url, parent: sender.inner ? { url: 'longtravel://window/', parent: null } : null }
    return { sender: contents, senderFrame: sender.none ? null : frame }
  }
  const invoke: StandIn['invoke'] = async (channel, ...given) => {
    const handler = handlers.get(channel) as ((...all: unknown[]) => unknown) | undefined
    if (handler === undefined) throw new Error(`no handler for ${channel}`)
    return structuredClone(await handler(from(), ...given.map((one) => structuredClone(one))))
  }
  const send: StandIn['send'] = (channel, ...given) => {
    const handler = handlers.get(channel) as ((...all: unknown[]) => unknown) | undefined
    handler?.(from(), ...given.map((one) => structuredClone(one)))
  }

  // Called with `new`, so that neither an arrow function nor a spy will do.
  function BrowserWindow(options: Record<string, unknown>) {
    let address = ''
    let shown = false
    windows.push({ options, address: () => address, shown: () => shown })
    app.emit('web-contents-created', contents)
    return {
      once: (_name: string, listener: () => void) => listener(),
      show: () => void (shown = true),
      loadURL: (url: string) => Promise.resolve(void (address = url)),
    }
  }
  BrowserWindow.getAllWindows = () => [{ isMinimized: () => true, restore: record('restore'), focus: record('focus') }]
  BrowserWindow.fromWebContents = () => ({})

  const setter = (name: string) => (handler: Listener) => void (session[name] = handler)
  const sessionModule = {
    on: (name: string, listener: Listener) => void (session[name] = listener),
    setPermissionRequestHandler: setter('ask'),
    setPermissionCheckHandler: setter('check'),
    setDevicePermissionHandler: setter('device'),
    webRequest: {
      onBeforeRequest: ({ urls }: { urls: string[] }, handler: Listener) => {
        session['request'] = handler
        session['urls'] = () => urls
      },
    },
  }
  const use = (name: string, ...given: unknown[]): unknown =>
    (session[name] as ((...all: unknown[]) => unknown) | undefined)?.(...given)

  return {
    module: {
      app: {
        ...app,
        setPath: record('setPath'),
        requestSingleInstanceLock: () => {
          calls.push('requestSingleInstanceLock')
          return first
        },
        enableSandbox: record('enableSandbox'),
        commandLine: { appendSwitch: record('appendSwitch') },
        quit: record('quit'),
        exit: (code: number) => exit.resolve(code),
        whenReady: () => Promise.resolve(),
      },
      BrowserWindow,
      Menu: { setApplicationMenu: record('setApplicationMenu'), buildFromTemplate: (items: unknown[]) => items.length },
      nativeTheme: { shouldUseDarkColors: false },
      protocol: {
        registerSchemesAsPrivileged: (given: typeof schemes) => void schemes.push(...given),
        handle: (_scheme: string, handler: StandIn['serve']) => void (serve = handler),
      },
      session: { defaultSession: sessionModule },
      dialog: {
        showErrorBox: record('showErrorBox'),
        showSaveDialog: (_window: unknown, { defaultPath }: { defaultPath: string }) => {
          dialogs.proposed.push(defaultPath)
          return Promise.resolve(dialogs.save)
        },
        showOpenDialog: () => Promise.resolve(dialogs.open),
      },
      ipcMain: {
        handle: (channel: string, handler: Listener) => void handlers.set(channel, handler),
        on: (channel: string, handler: Listener) => void handlers.set(channel, handler),
      },
      ipcRenderer: { invoke, send, on: fromShell.on },
      contextBridge: { exposeInMainWorld: (_name: string, given: Bridge) => void (bridge = given) },
    },
    calls,
    windows,
    app,
    contents: {
      ...inWindow,
      opens: (details) => (openHandler as unknown as StandIn['contents']['opens'])(details),
    },
    session: {
      asks: (permission) => {
        let decided = true
        use('ask', contents, permission, (may: boolean) => void (decided = may))
        return decided
      },
      checks: () => use('check') as boolean,
      device: () => use('device') as boolean,
      download: () => {
        const given = event()
        use('will-download', given)
        return given
      },
      requests: () => {
        let cancel: boolean | undefined
        use('request', {}, (decided: { cancel?: boolean }) => void (cancel = decided.cancel))
        return { urls: use('urls') as string[], cancel }
      },
    },
    schemes,
    serve: (request) => serve!(request),
    bridge: () => bridge!,
    sender,
    invoke,
    send,
    dialogs,
    exited: exit.promise,
  }
}

/** Puts a stand-in where modules loaded from now on find Electron. */
export const install = (fake: StandIn): void => {
  vi.doMock('electron', () => fake.module)
  vi.resetModules()
}
