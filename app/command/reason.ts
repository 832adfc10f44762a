/** The operating system's refusals in plain words. */
const REASONS: Readonly<Record<string, string>> = {
  ENOENT: 'there is no such file or folder',
  ENOTDIR: 'a part of the path is a file, not a folder',
  EISDIR: 'it is a folder',
  EACCES: 'the right to do so is missing',
  EPERM: 'the right to do so is missing',
  EROFS: 'the disk is read-only',
  ENOSPC: 'the disk is full',
  EDQUOT: 'the quota is used up',
  EMFILE: 'too many files are open',
  ENAMETOOLONG: 'the path is too long',
  ELOOP: 'links lead round in a circle',
  EBUSY: 'it is in use',
}

/** Why the system refused. What is no refusal of the system is a fault of the program and thrown on. */
export const reasonOf = (error: unknown): string => {
  if (!(error instanceof Error) || !('code' in error) || typeof error.code !== 'string') throw error
  return REASONS[error.code] ?? error.message
}
