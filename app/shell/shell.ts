/** The program as an Electron application: one window, one desk behind it, nothing from elsewhere. */
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { app, BrowserWindow, dialog, ipcMain, Menu, nativeTheme, protocol, session } from 'electron'
import { startDesk } from '../desk/desk.ts'
import { dataFolder } from '../folders.ts'
import { carry } from './carry.ts'
import { windowFiles } from './files.ts'
import { guardContents, guardSession } from './guard.ts'
import { lastingDesk, type LastingDesk } from './lasting-desk.ts'
import { MENU } from './menu.ts'
import { pathOf, SCHEME, WINDOW_ADDRESS } from './place.ts'
import { HEADERS } from './policy.ts'

/** The bundle stands in out/main, its neighbours in out/preload and out/renderer. */
const near = (path: string): string => fileURLToPath(new URL(path, import.meta.url))

/**
 * Starts the program, or hands over to the one that runs already on the same data folder. `folder` holds the built window. What
 * keeps it from starting is shown before it ends.
 */
export const start = async (folder = near('../renderer')): Promise<void> => {
  try {
    await open(folder)
  } catch (error) {
    dialog.showErrorBox('Longtravel', `The window cannot be opened: ${String(error)}`)
    app.exit(3)
  }
}

const open = async (folder: string): Promise<void> => {
  const data = dataFolder(process.env, process.platform)
  if (!('folder' in data)) {
    dialog.showErrorBox('Longtravel', data.message)
    app.exit(2)
    return
  }
  app.setPath('userData', join(data.folder, 'window'))
  if (!app.requestSingleInstanceLock()) {
    app.quit()
    return
  }
  protocol.registerSchemesAsPrivileged([
    { scheme: SCHEME, privileges: { standard: true, secure: true, supportFetchAPI: true } },
  ])
  app.enableSandbox()
  // The program asks no server for anything, and neither does the browser inside it.
  app.commandLine.appendSwitch('disable-background-networking')
  app.commandLine.appendSwitch('host-resolver-rules', 'MAP * ~NOTFOUND')
  app.on('web-contents-created', (_event, contents) => guardContents(contents))
  app.on('second-instance', showAgain)
  app.on('window-all-closed', () => app.quit())
  await app.whenReady()

  const desk = lastingDesk(() => startDesk({ home: data.folder }))
  closeBeforeQuit(desk)
  Menu.setApplicationMenu(Menu.buildFromTemplate(MENU))
  guardSession(session.defaultSession)
  serveWindow(folder)
  carry(ipcMain, desk)
  await openWindow()
}

/** Answers the window's own scheme from the built files. */
const serveWindow = (folder: string): void => {
  const files = windowFiles(folder)
  protocol.handle(SCHEME, async ({ url, method }) => {
    const path = pathOf(url)
    const found = path === undefined || method !== 'GET' ? undefined : await files(path)
    if (found === undefined) return new Response('no such file\n', { status: 404, headers: HEADERS })
    return new Response(found.bytes, { headers: { ...HEADERS, 'content-type': found.type } })
  })
}

const PAPER = '#FFFEFB'
const DARK_PAPER = '#10171F'

const openWindow = async (): Promise<void> => {
  const window = new BrowserWindow({
    title: 'Longtravel',
    width: 1440,
    height: 900,
    minWidth: 800,
    minHeight: 560,
    show: false,
    autoHideMenuBar: true,
    // Seen until the sheet is drawn.
    backgroundColor: nativeTheme.shouldUseDarkColors ? DARK_PAPER : PAPER,
    webPreferences: {
      preload: near('../preload/preload.cjs'),
      sandbox: true,
      contextIsolation: true,
      nodeIntegration: false,
      nodeIntegrationInWorker: false,
      nodeIntegrationInSubFrames: false,
      webSecurity: true,
      allowRunningInsecureContent: false,
      webviewTag: false,
      navigateOnDragDrop: false,
      // Its dictionaries would be fetched from a server.
      spellcheck: false,
    },
  })
  window.once('ready-to-show', () => window.show())
  await window.loadURL(WINDOW_ADDRESS)
}

const showAgain = (): void => {
  for (const window of BrowserWindow.getAllWindows()) {
    if (window.isMinimized()) window.restore()
    window.focus()
  }
}

/** The record is brought into its file before the program ends. */
const closeBeforeQuit = (desk: LastingDesk): void => {
  let closing = false
  app.on('will-quit', (event) => {
    event.preventDefault()
    if (closing) return
    closing = true
    void desk.close().then((closed) => {
      if (!closed.ok) dialog.showErrorBox('Longtravel', `The record was not closed: ${closed.error.message}`)
      app.exit(closed.ok ? 0 : 3)
    })
  })
}
