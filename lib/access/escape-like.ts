/** Takes the special meaning from the characters of a LIKE pattern, so that a search for "100%" finds "100%". */
export function escapeLike(text: string): string {
  return text.replace(/[\\%_]/g, '\\$&');
}
