/** The menu: what a system's own keys rest on (copying, the size of text, the window), under the roles that the system names. */
import type { MenuItemConstructorOptions } from 'electron'

export const MENU: MenuItemConstructorOptions[] = [
  ...(process.platform === 'darwin' ? [{ role: 'appMenu' } as const] : []),
  { role: 'editMenu' },
  {
    label: 'View',
    submenu: [
      { role: 'resetZoom' },
      { role: 'zoomIn' },
      { role: 'zoomOut' },
      { type: 'separator' },
      { role: 'togglefullscreen' },
    ],
  },
  { role: 'windowMenu' },
]
