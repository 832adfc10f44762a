import { describe, expect, test } from 'vitest'
import { dataFolder } from '../../app/folders.ts'
import { cautionsOf } from '../../app/store/place.ts'

describe('the data folder', () => {
  test.each([
    ['linux', { HOME: '/home/a' }, '/home/a/.local/share/longtravel'],
    ['linux', { HOME: '/home/a', XDG_DATA_HOME: '/data' }, '/data/longtravel'],
    // XDG Base Directory Specification 0.8: a relative path is invalid and ignored, an empty one counts as not set.
    ['linux', { HOME: '/home/a', XDG_DATA_HOME: 'data' }, '/home/a/.local/share/longtravel'],
    ['linux', { HOME: '/home/a', XDG_DATA_HOME: '' }, '/home/a/.local/share/longtravel'],
    ['freebsd', { HOME: '/home/a' }, '/home/a/.local/share/longtravel'],
    ['darwin', { HOME: '/Users/a', XDG_DATA_HOME: '/data' }, '/Users/a/Library/Application Support/Longtravel'],
    ['win32', { LOCALAPPDATA: 'C:\\Users\\a\\AppData\\Local' }, 'C:\\Users\\a\\AppData\\Local\\Longtravel'],
    ['win32', { USERPROFILE: 'C:\\Users\\a' }, 'C:\\Users\\a\\AppData\\Local\\Longtravel'],
    ['linux', { HOME: '/home/a', LONGTRAVEL_HOME: '/elsewhere' }, '/elsewhere'],
    ['darwin', { HOME: '/Users/a', LONGTRAVEL_HOME: '/elsewhere' }, '/elsewhere'],
    ['win32', { LONGTRAVEL_HOME: 'D:\\record' }, 'D:\\record'],
    ['linux', { HOME: '/home/a', LONGTRAVEL_HOME: '' }, '/home/a/.local/share/longtravel'],
  ])('on %s with %o is %s', (platform, environment, folder) => {
    expect(dataFolder(environment, platform)).toEqual({ folder })
  })

  test.each([
    ['linux', 'HOME'],
    ['darwin', 'HOME'],
    ['win32', 'LOCALAPPDATA'],
  ])('on %s without anything names %s', (platform, name) => {
    expect(dataFolder({}, platform)).toEqual({ message: expect.stringContaining(`${name} is not set`) as string })
  })
})

describe('a place where a database is not safe', () => {
  test.each([
    ['/home/a/Dropbox/Longtravel', 'linux', 0xef53, ['synchronised']],
    ['C:\\Users\\a\\OneDrive - Works Ltd\\Longtravel', 'win32', undefined, ['synchronised']],
    ['/Users/a/Library/CloudStorage/x/Longtravel', 'darwin', undefined, ['synchronised']],
    ['/Users/a/Library/Mobile Documents/x', 'darwin', undefined, ['synchronised']],
    ['/mnt/office', 'linux', 0x6969, ['network']],
    ['/mnt/office', 'linux', 0xff534d42, ['network']],
    ['/mnt/Nextcloud/office', 'linux', 0x6969, ['synchronised', 'network']],
    ['\\\\server\\share\\Longtravel', 'win32', undefined, ['network']],
    ['\\\\?\\C:\\Longtravel', 'win32', undefined, []],
    ['/home/a/.local/share/longtravel', 'linux', 0xef53, []],
    ['/home/a/dropboxes/OneDriver', 'linux', 0xef53, []],
    // The same number means another file system elsewhere.
    ['/Users/a/x', 'darwin', 0x6969, []],
  ])('%s on %s (%s): %o', (folder, platform, type, kinds) => {
    const found = cautionsOf(folder, platform, type)
    expect(found.map(({ kind }) => kind)).toEqual(kinds)
    for (const { message } of found) expect(message.startsWith(folder)).toBe(true)
  })
})
