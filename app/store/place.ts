/** Whether a folder seems to lie where a database is not safe. Signs only: their absence proves nothing. */
import { statfsSync } from 'node:fs'

export interface PlaceCaution {
  readonly kind: 'network' | 'synchronised'
  readonly message: string
}

/** Cautions on a folder that exists, as this machine sees it. */
export const placeCautions = (folder: string): readonly PlaceCaution[] =>
  cautionsOf(folder, process.platform, fileSystem(folder))

/**
 * Two signs, from the path and the kind of file system (statfs type, Linux only; undefined elsewhere).
 * A part of the path has the name that a synchronising program gives its folder: such programs copy the database without its
 * write-ahead log, and put older copies back. The folder is a network share: locks there are not reliable, and WAL needs
 * memory that all processes share.
 */
export const cautionsOf = (
  folder: string,
  platform: string,
  fileSystemType: number | undefined,
): readonly PlaceCaution[] => {
  const cautions: PlaceCaution[] = []
  const part = folder
    .split(platform === 'win32' ? /[\\/]/ : '/')
    .find((name) => SYNCHRONISED.some((sign) => sign.test(name)))
  if (part !== undefined)
    cautions.push({
      kind: 'synchronised',
      message: `${folder} seems to be kept the same on several machines ("${part}"); that can damage the record: name a folder of this machine by LONGTRAVEL_HOME`,
    })
  const share = platform === 'win32' && /^[\\/]{2}(?![?.])/.test(folder)
  const network = platform === 'linux' && fileSystemType !== undefined ? NETWORK.get(fileSystemType) : undefined
  if (share || network !== undefined)
    cautions.push({
      kind: 'network',
      message: `${folder} seems to lie on the network (${network ?? 'a share'}); that can damage the record: name a folder of this machine by LONGTRAVEL_HOME`,
    })
  return cautions
}

/** Folder names as the usual synchronising programs make them. */
const SYNCHRONISED = [
  /^OneDrive(?: - .+)?$/i,
  /^Dropbox(?: \(.+\))?$/i,
  /^Google ?Drive$/i,
  /^My Drive$/i,
  /^iCloud ?Drive$/i,
  /^Mobile Documents$/i,
  /^CloudStorage$/i,
  /^Nextcloud\d*$/i,
  /^ownCloud\d*$/i,
  /^pCloud ?Drive$/i,
  /^Box Sync$/i,
  /^Syncthing$/i,
]

/** File systems over a network by the number that Linux's statfs(2) gives them (its manual page and linux/magic.h). */
const NETWORK = new Map([
  [0x6969, 'NFS'],
  [0x517b, 'SMB'],
  [0xff534d42, 'SMB'],
  [0xfe534d42, 'SMB'],
  [0x5346414f, 'AFS'],
  [0x6b414653, 'AFS'],
  [0x73757245, 'Coda'],
  [0x00c36400, 'Ceph'],
  [0x01021997, '9P'],
])

const fileSystem = (folder: string): number | undefined => {
  try {
    return process.platform === 'linux' ? statfsSync(folder).type : undefined
  } catch {
    // A folder that cannot be asked cannot be opened either, and that is told in its own place.
    return undefined
  }
}
