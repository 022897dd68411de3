const longest = 40;

/** A piece of a file as a message may show it. */
export function shortened(text: string): string {
  const line = text.replace(/\s+/g, ' ').trim();
  return line.length > longest ? `${line.slice(0, longest)}…` : line;
}
