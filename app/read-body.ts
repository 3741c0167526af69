/** The body of a request, or undefined: it is given up as soon as it grows past `most` bytes. */
export async function readBody(request: Request, most: number): Promise<Buffer | undefined> {
  const parts: Uint8Array[] = [];
  let length = 0;
  const reader = request.body?.getReader();
  for (let part = await reader?.read(); part && !part.done; part = await reader?.read()) {
    length += part.value.length;
    if (length > most) {
      await reader?.cancel();
      return undefined;
    }
    parts.push(part.value);
  }
  return Buffer.concat(parts);
}
