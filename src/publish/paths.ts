/**
 * True for a relative path with forward slashes that stays where it is put: no empty, `.` or `..` part,
 * no backslash, drive letter or control character.
 */
export function isPlainPath(path: string): boolean {
  // biome-ignore lint/suspicious/noControlCharactersInRegex: they are what is looked for
  if (path === '' || /[\\:\u0000-\u001f]/.test(path)) return false;
  return path.split('/').every((part) => part !== '' && part !== '.' && part !== '..');
}

/** True for a name that can be a folder of the output: a pack's id, that of a copy (`id--audience`), a revision. */
export function isFolderName(name: string): boolean {
  return /^[A-Za-z0-9]+(?:(?:--|[-_.])[A-Za-z0-9]+)*$/.test(name);
}
