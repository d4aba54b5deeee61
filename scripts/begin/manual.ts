// The manual of the format without the part that tells how the demonstration was invented.

const demonstrationPart = /\n## How the demonstration was invented\n[\s\S]*?(?=\n## |$)/;

/** content/README.md for a group of its own; unchanged where the part is gone already. */
export function manualWithoutDemonstration(manual: string): string {
  return `${manual.replace(demonstrationPart, '').trimEnd()}\n`;
}
