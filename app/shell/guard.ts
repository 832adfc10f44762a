/** Refusals: the window shows the program and nothing else, whatever a page inside it tries. */
import type { Session, WebContents } from 'electron'

/** No contents go anywhere, open anything or take in another page. */
export const guardContents = (contents: WebContents): void => {
  contents.on('will-navigate', (event) => event.preventDefault())
  contents.on('will-frame-navigate', (event) => event.preventDefault())
  contents.on('will-redirect', (event) => event.preventDefault())
  contents.on('will-attach-webview', (event) => event.preventDefault())
  contents.setWindowOpenHandler(() => ({ action: 'deny' }))
}

/** No permission, no device, no download past the dialog, no request that leaves the machine or reads a file. */
export const guardSession = (session: Session): void => {
  session.setPermissionRequestHandler((_contents, _permission, decide) => decide(false))
  session.setPermissionCheckHandler(() => false)
  session.setDevicePermissionHandler(() => false)
  session.on('will-download', (event) => event.preventDefault())
  session.webRequest.onBeforeRequest({ urls: FOREIGN }, (_request, decide) => decide({ cancel: true }))
}

const FOREIGN = ['http', 'https', 'ws', 'wss', 'file'].map((scheme) => `${scheme}://*/*`)
