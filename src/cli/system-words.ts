/** What the operating system's error codes mean, as the end of `found ...`. */
const WORDS: Record<string, string> = {
  ENOENT: 'a folder that does not exist',
  ENOTDIR: 'a path that leads through a file',
  EISDIR: 'a folder',
  EACCES: 'no permission',
  EPERM: 'no permission',
  EROFS: 'a disk that is read only',
  ENOSPC: 'a full disk',
  EDQUOT: 'a full disk quota',
  ENAMETOOLONG: 'a name that is too long for this system',
  ELOOP: 'links that lead in a circle',
  EBUSY: 'a file or folder in use',
  EMFILE: 'too many open files',
  ERR_FS_FILE_TOO_LARGE: 'more than two gigabytes',
  ERR_INVALID_ARG_VALUE: 'a name with a character that no path may hold',
};

export const errorCode = (error: unknown): string | undefined => {
  const code = (error as { code?: unknown } | null)?.code;
  return typeof code === 'string' ? code : undefined;
};

/** A system error in words; an error without a system code is a fault of ours and is thrown again. */
export const systemWords = (error: unknown): string => {
  const code = errorCode(error);
  if (code === undefined) throw error;
  return WORDS[code] ?? `the system's error ${code}`;
};
