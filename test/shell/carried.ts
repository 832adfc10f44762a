/** A desk behind the shell's channels and the window's bridge. */
import type { IpcMain } from 'electron'
import type { LastingDesk } from '../../app/shell/lasting-desk.ts'
import { bridgeDesk } from '../../renderer/desk/bridge.ts'
import type { Desk } from '../../renderer/desk/desk.ts'
import { install, standIn, type StandIn } from './electron.ts'

/** Loads the shell's side and the preload anew, each with the same stand-in. */
export const carried = async (desk: LastingDesk): Promise<StandIn> => {
  const fake = standIn()
  install(fake)
  const { carry } = await import('../../app/shell/carry.ts')
  carry(fake.module['ipcMain'] as IpcMain, desk)
  await import('../../app/preload.ts')
  return fake
}

export const overShell = async (desk: LastingDesk): Promise<Desk> => bridgeDesk((await carried(desk)).bridge())
