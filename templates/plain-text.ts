/** A sentence that a person typed, as rich text: its dollar signs and stars are only that. */
export function plain(text: string): string {
  return text.replaceAll('$', '\\$').replaceAll('**', '* *');
}
