/** Why a log could not be read to its end, in words. */
export function failureWords(error: unknown): string {
  if (error instanceof DOMException && error.name === 'NotReadableError')
    return 'The file cannot be read any more: it was changed, moved or removed while it was read.';
  if (error instanceof TypeError) return 'The file is packed, and its packing is broken.';
  return error instanceof Error && error.message !== '' ? error.message : 'The file cannot be read.';
}
